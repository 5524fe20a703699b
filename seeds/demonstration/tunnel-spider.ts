import {
  atLeast,
  between,
  betweenF,
  body,
  classificationOf,
  humidity,
  meanOf,
  namesOf,
  photoperiod,
  temperature,
} from './build.js'
import type { DemonstrationSpecies } from './content.js'

export const TUNNEL_SPIDER: DemonstrationSpecies = {
  key: 'tunnel-spider',
  revisions: [
    {
      publishedAt: '2026-05-25T17:50:00Z',
      summary: 'First version; kept without a gradient, so the ranges are for the whole enclosure',
      content: {
        names: namesOf({
          scientific: 'Cuniculatrix profunda',
          authority: 'Ledger, 2006',
          synonyms: ['Cuniculatrix arenosa'],
          common: ['Ledge tunnel spider', 'Dune burrower'],
        }),
        classification: classificationOf({
          class: 'Arachnida',
          order: 'Araneae',
          suborder: null,
          family: 'Cuniculatricidae',
          activeTime: 'Nocturnal',
          microhabitat: 'Fossorial',
        }),
        ranges: [
          temperature(
            'whole-enclosure',
            'day',
            ['22', '25'],
            { lifeStage: 'adult', lowerLimit: '12', upperLimit: '31' },
            [
              between('standards-board', 'table 13, row 1', '21', '25'),
              meanOf('ledge-burrows', 'table 1', '23.6', '1.6', 28),
            ],
          ),
          temperature(
            'whole-enclosure',
            'day',
            ['23', '25'],
            { lifeStage: 'juvenile', lowerLimit: '15', upperLimit: '30' },
            [
              between('hollow-manual', 'p. 101', '22', '25'),
              betweenF('spider-keeping', 'section "Slings"', '73', '78'),
            ],
          ),
          temperature('whole-enclosure', 'night', ['18', '21.5'], { lowerLimit: '11' }, [
            between('standards-board', 'table 13, row 1', '17', '22'),
            meanOf('field-stations', 'table 5, Dune Ledges', '19.8', '2.0', 396),
          ]),
          temperature(
            'substrate',
            'any',
            ['20.5', '23.5'],
            {
              lifeStage: 'adult',
              lowerLimit: '12',
              upperLimit: '29',
              note: 'At the depth of the burrow’s end.',
            },
            [
              between('hollow-manual', 'p. 102', '20', '24'),
              meanOf('ledge-burrows', 'table 2', '22.1', '1.7', 28),
            ],
          ),
          temperature(
            'substrate',
            'any',
            ['21.5', '24'],
            { lifeStage: 'juvenile', lowerLimit: '14', upperLimit: '29' },
            [
              between('hollow-manual', 'p. 102', '21', '24'),
              betweenF('spider-keeping', 'section "Slings"', '70', '76'),
            ],
          ),
          temperature(
            'substrate',
            'any',
            ['23', '25'],
            { lifeStage: 'egg', lowerLimit: '18', upperLimit: '29', note: 'Around the egg sac.' },
            [
              between('hollow-manual', 'p. 104', '23', '25'),
              betweenF('spider-keeping', 'section "Egg sacs"', '73', '77'),
            ],
          ),
          // The deliberate flaw of this page: nobody but keepers has said anything about it.
          humidity(
            'whole-enclosure',
            'any',
            ['55', '70'],
            { lifeStage: 'adult', lowerLimit: '40', upperLimit: '85' },
            [
              between('spider-keeping', 'section "Water"', '55', '70'),
              between('circle-returns', 'question 14', '50', '70'),
            ],
          ),
          humidity('whole-enclosure', 'any', ['65', '80'], { lifeStage: 'juvenile', lowerLimit: '50' }, [
            between('hollow-manual', 'p. 101', '65', '80'),
            atLeast('spider-keeping', 'section "Slings"', '65'),
          ]),
          humidity('substrate', 'any', ['71', '85'], { lowerLimit: '50' }, [
            between('hollow-manual', 'p. 102', '70', '85'),
            meanOf('ledge-burrows', 'table 2', '78', '7', 28),
          ]),
          photoperiod(['11', '13'], {}, [
            between('standards-board', 'table 11', '11', '13'),
            between('vivarium-year', 'p. 80', '12', '13'),
          ]),
        ],
        physiology: [
          body('selected-body-temperature', 'adult', 'ledge-burrows', 'table 3', ['25.6', '1.3'], 10),
          body('selected-body-temperature', 'adult', 'nine-ectotherms', 'table 4.1', ['24.9', '1.7'], 12),
          body('critical-thermal-maximum', 'adult', 'nine-ectotherms', 'table 6.1', ['43.0', '0.9'], 12),
          body('critical-thermal-minimum', 'adult', 'nine-ectotherms', 'table 6.2', ['3.4', '1.2'], 12),
        ],
        prose: [
          {
            key: 'place',
            heading: 'Where it lives',
            markdown:
              'Firm sand on the lee side of the Dune Ledges. The burrow ends where the sand stays cool and moist through the summer ' +
              '[@ledge-burrows, table 2].',
          },
          {
            key: 'enclosure',
            heading: 'Setting up',
            markdown:
              'Depth, not area: twenty centimetres of sandy soil, pressed firm and moist below. **No lamp and no heat mat**: it digs ' +
              'away from heat and into a mat [@hollow-manual, p. 101]. Warm the room.',
          },
          {
            key: 'watch',
            heading: 'What to watch',
            markdown:
              'A sealed burrow means a moult. Leave it alone, keep the water dish full, and count the weeks [@spider-keeping, section ' +
              '"Water"]. Its hairs irritate skin and eyes.',
          },
        ],
      },
    },
  ],
}
