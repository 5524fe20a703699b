import {
  atMost,
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

export const DRIPLEAF_FROG: DemonstrationSpecies = {
  key: 'dripleaf-frog',
  revisions: [
    {
      publishedAt: '2026-05-04T06:30:00Z',
      summary: 'First version, from egg to adult',
      content: {
        names: namesOf({
          scientific: 'Stillohyla ilverensis',
          authority: 'Ilvery, 2012',
          synonyms: ['Stillohyla guttata'],
          common: ['Dripleaf frog', 'Ilver drop frog'],
        }),
        classification: classificationOf({
          class: 'Amphibia',
          order: 'Anura',
          suborder: null,
          family: 'Stillohylidae',
          activeTime: 'Nocturnal',
          microhabitat: 'Arboreal',
        }),
        ranges: [
          temperature('warm-end-air', 'day', ['24', '26'], { lowerLimit: '16', upperLimit: '29' }, [
            between('standards-board', 'table 12, row 1', '23', '26'),
            meanOf('drip-leaf', 'table 2', '25.1', '1.1', 74),
          ]),
          // The deliberate flaw of this page: warmer than the animal seeks, where it cannot get away.
          temperature(
            'warm-end-air',
            'day',
            ['25', '28'],
            { lifeStage: 'metamorph', lowerLimit: '18', upperLimit: '31' },
            [between('hollow-manual', 'p. 93', '25', '28'), betweenF('frog-room', 'week 9', '77', '82')],
          ),
          temperature('warm-end-air', 'night', ['20', '22'], { lowerLimit: '15' }, [
            between('standards-board', 'table 12, row 1', '19', '22'),
            meanOf('field-stations', 'table 5, Ilver Forest', '21.0', '1.4', 388),
          ]),
          temperature('cool-end-air', 'day', ['21', '23.5'], { lowerLimit: '15', upperLimit: '28' }, [
            between('standards-board', 'table 12, row 1', '21', '24'),
            meanOf('field-stations', 'table 4, Ilver Forest', '22.4', '1.5', 391),
          ]),
          temperature('cool-end-air', 'night', ['18', '21'], { lowerLimit: '14' }, [
            between('standards-board', 'table 12, row 1', '18', '21'),
            betweenF('frog-room', 'week 2', '65', '70'),
          ]),
          temperature('shade', 'day', ['21.5', '24'], { lowerLimit: '15', upperLimit: '28' }, [
            between('hollow-manual', 'p. 92', '21', '24'),
            meanOf('drip-leaf', 'table 3', '22.7', '1.3', 74),
          ]),
          temperature('humid-hide', 'any', ['21', '23.5'], { lowerLimit: '15', upperLimit: '28' }, [
            between('hollow-manual', 'p. 92', '21', '24'),
            meanOf('drip-leaf', 'table 3', '22.4', '1.2', 74),
          ]),
          temperature('substrate', 'any', ['20.5', '23.5'], { lowerLimit: '15', upperLimit: '28' }, [
            between('hollow-manual', 'p. 92', '20', '24'),
            meanOf('drip-leaf', 'table 3', '22.0', '1.5', 74),
          ]),
          temperature('water', 'any', ['22', '24.5'], { lowerLimit: '16', upperLimit: '28' }, [
            between('hollow-manual', 'p. 94', '22', '25'),
            meanOf('drip-leaf', 'table 4', '23.4', '1.3', 40),
          ]),
          temperature(
            'water',
            'any',
            ['23.5', '25.5'],
            { lifeStage: 'larva', lowerLimit: '18', upperLimit: '30' },
            [between('hollow-manual', 'p. 94', '23', '26'), betweenF('frog-room', 'week 4', '74', '78')],
          ),
          temperature(
            'water',
            'any',
            ['22', '24.5'],
            { lifeStage: 'egg', lowerLimit: '17', upperLimit: '29' },
            [between('hollow-manual', 'p. 94', '22', '25'), betweenF('frog-room', 'week 1', '72', '76')],
          ),
          humidity('warm-end-air', 'day', ['76', '95'], { lowerLimit: '60' }, [
            between('standards-board', 'table 12, row 1', '75', '95'),
            meanOf('drip-leaf', 'table 5', '86', '10', 74),
          ]),
          humidity('cool-end-air', 'day', ['85', '100'], { lowerLimit: '65' }, [
            between('standards-board', 'table 12, row 1', '85', '100'),
            meanOf('field-stations', 'table 8, Ilver Forest', '91', '6', 391),
          ]),
          humidity('warm-end-air', 'night', ['85', '100'], { lowerLimit: '65' }, [
            between('standards-board', 'table 12, row 1', '85', '100'),
            between('frog-room', 'week 2', '80', '95'),
          ]),
          humidity('cool-end-air', 'night', ['90', '100'], { lowerLimit: '70' }, [
            between('standards-board', 'table 12, row 1', '90', '100'),
            meanOf('field-stations', 'table 8, Ilver Forest', '96', '4', 388),
          ]),
          humidity('humid-hide', 'any', ['90', '100'], { lowerLimit: '70' }, [
            between('hollow-manual', 'p. 92', '90', '100'),
            meanOf('drip-leaf', 'table 5', '95', '5', 74),
          ]),
          uvIndex('warm-end-air', 'typical', ['0', '0.6'], { zone: 1 }, [
            between('open-sky', 'table 2', '0.1', '0.6'),
            atMost('standards-board', 'table 9', '0.7'),
          ]),
          uvIndex('warm-end-air', 'maximum', ['0.6', '1.4'], { zone: 1, upperLimit: '2.0' }, [
            between('open-sky', 'table 2', '0.6', '1.5'),
            atMost('standards-board', 'table 9', '1.4'),
          ]),
          photoperiod(['12', '13'], {}, [
            between('standards-board', 'table 11', '12', '13'),
            between('vivarium-year', 'p. 77', '12', '12.5'),
          ]),
        ],
        physiology: [
          body('selected-body-temperature', 'adult', 'drip-leaf', 'table 6', ['26.5', '0.9'], 14),
          body('selected-body-temperature', 'adult', 'nine-ectotherms', 'table 4.1', ['25.8', '1.1'], 10),
          body('field-body-temperature', 'adult', 'drip-leaf', 'table 2', ['24.0', '1.6'], 74),
          body('critical-thermal-maximum', 'adult', 'nine-ectotherms', 'table 6.1', ['38.9', '0.5'], 10),
          body('critical-thermal-maximum', 'larva', 'nine-ectotherms', 'table 6.1', ['40.2', '0.4'], 15),
          body('critical-thermal-minimum', 'adult', 'nine-ectotherms', 'table 6.2', ['9.1', '0.8'], 10),
        ],
        prose: [
          {
            key: 'place',
            heading: 'Where it lives',
            markdown:
              'Broad leaves over the streams of the Ilver Forest, where something is always dripping. Day and night differ by three or ' +
              'four degrees and the air is hardly ever drier than 80 % [@drip-leaf, table 5].',
          },
          {
            key: 'enclosure',
            heading: 'Setting up',
            markdown:
              'Glass, leaves, a shallow pool and **air that moves**: wet and stale is worse than a little too dry [@frog-room, week 2]. ' +
              'No basking lamp; warm the room instead, and keep one end cooler [@hollow-manual, p. 92].',
          },
          {
            key: 'watch',
            heading: 'What to watch',
            markdown:
              'Its skin takes up whatever is in the water: let tap water stand, or filter it. Young frogs just out of the pool dry out ' +
              'within minutes under a fan [@frog-room, week 9].',
          },
        ],
      },
    },
  ],
}
