import {
  atMost,
  baskingHours,
  between,
  betweenF,
  body,
  classificationOf,
  humidity,
  meanOf,
  namesOf,
  photoperiod,
  temperature,
  uvIndex,
} from './build.js'
import type { DemonstrationSpecies } from './content.js'

export const DOWN_TORTOISE: DemonstrationSpecies = {
  key: 'down-tortoise',
  revisions: [
    {
      publishedAt: '2026-04-06T13:40:00Z',
      summary: 'First version, with grazing sites measured over two years',
      content: {
        names: namesOf({
          scientific: 'Pascuochelys sarnica',
          authority: 'Sarnfield, 1999',
          synonyms: ['Pascuochelys collina'],
          common: ['Down tortoise', 'Sarn grazer'],
        }),
        classification: classificationOf({
          class: 'Reptilia',
          order: 'Testudines',
          suborder: null,
          family: 'Pascuochelyidae',
          activeTime: 'Diurnal',
          microhabitat: 'Terrestrial',
        }),
        ranges: [
          temperature('basking-surface', 'day', ['34', '38'], { lifeStage: 'adult', upperLimit: '44' }, [
            between('standards-board', 'table 8, row 1', '33', '37'),
            meanOf('down-tortoises', 'table 2', '36.0', '2.2', 52),
          ]),
          temperature('basking-surface', 'day', ['32', '36'], { lifeStage: 'juvenile', upperLimit: '42' }, [
            between('hollow-manual', 'p. 71', '32', '35'),
            betweenF('tortoise-keeping', 'year 1', '90', '97'),
          ]),
          temperature('basking-air', 'day', ['31', '35'], { upperLimit: '39' }, [
            between('hollow-manual', 'p. 71', '31', '34'),
            meanOf('down-tortoises', 'table 2', '33.0', '2.0', 52),
          ]),
          temperature('warm-end-air', 'day', ['27', '30.5'], { lowerLimit: '15', upperLimit: '36' }, [
            between('standards-board', 'table 8, row 1', '26', '30'),
            meanOf('field-stations', 'table 4, Sarn Downs', '28.8', '2.2', 408),
          ]),
          temperature('warm-end-air', 'night', ['17', '21'], { lowerLimit: '11' }, [
            between('standards-board', 'table 8, row 1', '16', '21'),
            betweenF('tortoise-keeping', 'year 2', '62', '70'),
          ]),
          temperature('cool-end-air', 'day', ['20.5', '25'], { lowerLimit: '12', upperLimit: '32' }, [
            between('standards-board', 'table 8, row 1', '20', '24'),
            meanOf('field-stations', 'table 4, Sarn Downs', '22.7', '2.3', 408),
          ]),
          // The deliberate flaw of this page: no source goes below 15.3 °C here.
          temperature('cool-end-air', 'night', ['12.5', '18'], { lowerLimit: '9' }, [
            between('standards-board', 'table 8, row 1', '16', '20'),
            meanOf('field-stations', 'table 5, Sarn Downs', '17.2', '1.9', 402),
          ]),
          temperature('warm-hide', 'day', ['24', '27.5'], { upperLimit: '33' }, [
            between('hollow-manual', 'p. 72', '24', '28'),
            betweenF('tortoise-keeping', 'year 2', '75', '82'),
          ]),
          temperature('warm-hide', 'night', ['18', '22'], { lowerLimit: '11' }, [
            between('hollow-manual', 'p. 72', '18', '22'),
            betweenF('tortoise-keeping', 'year 2', '64', '72'),
          ]),
          temperature('cool-hide', 'day', ['19', '24'], { upperLimit: '30' }, [
            between('hollow-manual', 'p. 72', '20', '24'),
            meanOf('down-tortoises', 'table 3', '20.9', '2.1', 52),
          ]),
          temperature(
            'humid-hide',
            'any',
            ['24', '27.5'],
            { lifeStage: 'juvenile', lowerLimit: '15', upperLimit: '31' },
            [
              between('hollow-manual', 'p. 73', '24', '27'),
              betweenF('tortoise-keeping', 'year 1', '75', '82'),
            ],
          ),
          temperature('shade', 'day', ['20', '25.5'], { upperLimit: '31' }, [
            between('standards-board', 'table 8, row 1', '20', '25'),
            meanOf('down-tortoises', 'table 3', '23.1', '2.8', 52),
          ]),
          temperature('substrate', 'day', ['22.5', '27'], { upperLimit: '34' }, [
            between('hollow-manual', 'p. 73', '22', '27'),
            meanOf('down-tortoises', 'table 3', '25.1', '3.0', 52),
          ]),
          temperature(
            'substrate',
            'any',
            ['29', '31'],
            { lifeStage: 'egg', lowerLimit: '26', upperLimit: '33', note: 'Of the medium the eggs lie in.' },
            [between('hollow-manual', 'p. 77', '29', '31'), betweenF('tortoise-keeping', 'eggs', '84', '88')],
          ),
          humidity('warm-end-air', 'day', ['30', '50'], { upperLimit: '80' }, [
            between('standards-board', 'table 8, row 1', '30', '50'),
            meanOf('field-stations', 'table 8, Sarn Downs', '41', '11', 408),
          ]),
          humidity('cool-end-air', 'day', ['40', '60'], { upperLimit: '85' }, [
            between('standards-board', 'table 8, row 1', '40', '60'),
            meanOf('field-stations', 'table 8, Sarn Downs', '52', '12', 408),
          ]),
          humidity('humid-hide', 'any', ['70', '85'], {}, [
            between('hollow-manual', 'p. 73', '70', '85'),
            between('tortoise-keeping', 'year 2', '65', '80'),
          ]),
          humidity('humid-hide', 'any', ['80', '95'], { lifeStage: 'juvenile', lowerLimit: '60' }, [
            between('hollow-manual', 'p. 73', '80', '95'),
            between('tortoise-keeping', 'year 1', '85', '100'),
          ]),
          uvIndex('basking-air', 'typical', ['1.0', '2.4'], { zone: 3 }, [
            between('standards-board', 'table 9', '1.0', '2.6'),
            between('open-sky', 'table 2', '1.1', '2.4'),
          ]),
          uvIndex('basking-air', 'typical', ['1.0', '1.8'], { lifeStage: 'juvenile', zone: 3 }, [
            between('hollow-manual', 'p. 74', '0.9', '1.8'),
            between('open-sky', 'table 2', '1.0', '1.6'),
          ]),
          uvIndex('basking-air', 'maximum', ['2.9', '6.0'], { zone: 3, upperLimit: '8.0' }, [
            between('open-sky', 'table 2', '2.9', '6.4'),
            atMost('standards-board', 'table 9', '6.0'),
          ]),
          uvIndex('shade', 'typical', ['0', '0.6'], {}, [
            between('open-sky', 'table 3', '0.1', '0.6'),
            atMost('standards-board', 'table 9', '0.7'),
          ]),
          photoperiod(['12', '14'], {}, [
            between('standards-board', 'table 11', '12', '14'),
            between('vivarium-year', 'p. 70', '13', '14'),
          ]),
          baskingHours(['8', '10'], {}, [
            between('hollow-manual', 'p. 71', '8', '10'),
            meanOf('down-tortoises', 'figure 2', '8.6', '1.4', 52),
          ]),
        ],
        physiology: [
          body('selected-body-temperature', 'adult', 'down-tortoises', 'table 5', ['31.8', '1.5'], 12),
          body('selected-body-temperature', 'adult', 'nine-ectotherms', 'table 4.1', ['30.9', '1.2'], 7),
          body('field-body-temperature', 'adult', 'down-tortoises', 'table 4', ['29.8', '2.7'], 96),
          body('critical-thermal-maximum', 'adult', 'nine-ectotherms', 'table 6.1', ['42.8', '0.6'], 7),
          body('critical-thermal-minimum', 'adult', 'nine-ectotherms', 'table 6.2', ['5.1', '0.9'], 7),
        ],
        prose: [
          {
            key: 'place',
            heading: 'Where it lives',
            markdown:
              'Short turf on chalk, with thorn scrub to hide under at noon. It grazes from two hours after sunrise and again late in ' +
              'the afternoon [@down-tortoises, figure 2].',
          },
          {
            key: 'enclosure',
            heading: 'Setting up',
            markdown:
              'Floor space before everything else. One warm corner with **bright light and UV from above**, a long walk to the cool ' +
              'end, and for young ones a box of damp soil to sleep in [@hollow-manual, p. 73].',
          },
          {
            key: 'watch',
            heading: 'What to watch',
            markdown:
              'Raised too dry, the shell grows in steep cones [@tortoise-keeping, year 1]. A tortoise on its back under a lamp dies ' +
              'within the hour: keep stones and slopes away from the heat.',
          },
        ],
      },
    },
  ],
}
