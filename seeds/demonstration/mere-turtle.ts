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

const fahrenheit = { unit: 'degF' } as const

export const MERE_TURTLE: DemonstrationSpecies = {
  key: 'mere-turtle',
  revisions: [
    {
      publishedAt: '2026-04-20T15:15:00Z',
      summary: 'First version, basking ranges as printed in °F',
      content: {
        names: namesOf({
          scientific: 'Lacunemys catenata',
          authority: 'Meredan & Quill, 2003',
          synonyms: ['Lacunemys borealis'],
          common: ['Mere turtle', 'Chain-mere turtle'],
        }),
        classification: classificationOf({
          class: 'Reptilia',
          order: 'Testudines',
          suborder: null,
          family: 'Lacunemydidae',
          activeTime: 'Diurnal',
          microhabitat: 'Semi-Aquatic',
        }),
        ranges: [
          temperature(
            'basking-surface',
            'day',
            ['90', '96'],
            { ...fahrenheit, lifeStage: 'adult', upperLimit: '108' },
            [
              between('standards-board', 'table 10, row 1', '31', '35'),
              meanOf('mere-turtles', 'table 2', '34.2', '2.0', 61),
            ],
          ),
          temperature(
            'basking-surface',
            'day',
            ['88', '92'],
            { ...fahrenheit, lifeStage: 'hatchling', upperLimit: '102' },
            [
              between('hollow-manual', 'p. 81', '30', '33'),
              betweenF('turtle-rearing', 'month 1', '88', '93'),
            ],
          ),
          temperature('basking-air', 'day', ['29', '32.5'], { upperLimit: '38' }, [
            between('hollow-manual', 'p. 81', '29', '32'),
            meanOf('mere-turtles', 'table 2', '31.0', '2.1', 61),
          ]),
          temperature(
            'water',
            'day',
            ['23', '26'],
            { lifeStage: 'adult', lowerLimit: '12', upperLimit: '31' },
            [
              between('standards-board', 'table 10, row 1', '22', '26'),
              meanOf('mere-turtles', 'table 3', '24.1', '1.9', 300),
            ],
          ),
          temperature('water', 'night', ['20.5', '24'], { lifeStage: 'adult', lowerLimit: '12' }, [
            between('standards-board', 'table 10, row 1', '20', '24'),
            meanOf('mere-turtles', 'table 3', '22.0', '1.6', 300),
          ]),
          temperature(
            'water',
            'any',
            ['25', '28'],
            { lifeStage: 'hatchling', lowerLimit: '18', upperLimit: '31' },
            [
              between('hollow-manual', 'p. 83', '25', '28'),
              between('standards-board', 'table 10, row 2', '24', '27'),
              // The deliberate flaw of this page: °F taken down as °C.
              between('turtle-rearing', 'month 1', '77', '82'),
            ],
          ),
          temperature('warm-end-air', 'day', ['25', '29'], { lowerLimit: '15', upperLimit: '35' }, [
            between('standards-board', 'table 10, row 1', '24', '28'),
            meanOf('field-stations', 'table 4, Chain Meres', '27.0', '2.2', 399),
          ]),
          temperature('warm-end-air', 'night', ['18', '22'], { lowerLimit: '12' }, [
            between('standards-board', 'table 10, row 1', '18', '22'),
            meanOf('field-stations', 'table 5, Chain Meres', '19.6', '2.0', 395),
          ]),
          temperature('cool-end-air', 'day', ['21', '25'], { lowerLimit: '13', upperLimit: '32' }, [
            between('standards-board', 'table 10, row 1', '21', '25'),
            betweenF('circle-returns', 'question 8', '70', '76'),
          ]),
          temperature('cool-end-air', 'night', ['16', '20'], { lowerLimit: '11' }, [
            between('hollow-manual', 'p. 82', '16', '20'),
            meanOf('field-stations', 'table 5, Chain Meres', '17.8', '1.9', 395),
          ]),
          temperature('shade', 'day', ['20', '25'], { upperLimit: '31' }, [
            between('hollow-manual', 'p. 82', '20', '25'),
            meanOf('field-stations', 'table 6, Chain Meres', '23.0', '2.4', 399),
          ]),
          temperature(
            'substrate',
            'any',
            ['27', '29'],
            { lifeStage: 'egg', lowerLimit: '24', upperLimit: '32', note: 'Of the medium the eggs lie in.' },
            [between('hollow-manual', 'p. 88', '27', '29'), betweenF('turtle-rearing', 'eggs', '79', '84')],
          ),
          humidity('cool-end-air', 'any', ['50', '75'], { upperLimit: '95' }, [
            between('standards-board', 'table 10, row 1', '50', '75'),
            meanOf('field-stations', 'table 8, Chain Meres', '62', '12', 399),
          ]),
          uvIndex('basking-air', 'typical', ['1.0', '2.2'], { zone: 3 }, [
            between('standards-board', 'table 9', '1.0', '2.6'),
            between('open-sky', 'table 2', '0.9', '1.9'),
          ]),
          uvIndex('basking-air', 'maximum', ['2.9', '5.0'], { zone: 3, upperLimit: '7.0' }, [
            between('open-sky', 'table 2', '2.9', '5.3'),
            atMost('standards-board', 'table 9', '5.0'),
          ]),
          photoperiod(['12', '14'], {}, [
            between('standards-board', 'table 11', '12', '14'),
            between('vivarium-year', 'p. 73', '12', '13'),
          ]),
          baskingHours(['6', '9'], {}, [
            between('hollow-manual', 'p. 81', '6', '8'),
            meanOf('mere-turtles', 'figure 4', '7.4', '1.8', 61),
          ]),
        ],
        physiology: [
          body('selected-body-temperature', 'adult', 'mere-turtles', 'table 5', ['29.4', '1.2'], 15),
          body('selected-body-temperature', 'adult', 'nine-ectotherms', 'table 4.1', ['28.6', '1.4'], 8),
          body('field-body-temperature', 'adult', 'mere-turtles', 'table 4', ['27.0', '2.6'], 120),
          body('critical-thermal-maximum', 'adult', 'nine-ectotherms', 'table 6.1', ['41.5', '0.8'], 8),
          body('critical-thermal-minimum', 'adult', 'nine-ectotherms', 'table 6.2', ['4.4', '1.0'], 8),
        ],
        prose: [
          {
            key: 'place',
            heading: 'Where it lives',
            markdown:
              'The Chain Meres, a string of shallow ponds joined by ditches. Fallen logs are where it warms up, six or seven hours on ' +
              'a fine day [@mere-turtles, figure 4].',
          },
          {
            key: 'enclosure',
            heading: 'Setting up',
            markdown:
              'Deep water, strong filtering, and a **dry** place to bask that it can climb without slipping. Guard every heater in the ' +
              'water and never fix a lamp where it can fall in [@hollow-manual, p. 84]; local codes say what may hang over water.',
          },
          {
            key: 'watch',
            heading: 'What to watch',
            markdown:
              'Hatchlings want warmer water than adults, yet not warmer than the place to bask [@standards-board, table 10]. Soft shell ' +
              'edges and swollen eyes are for a veterinarian.',
          },
        ],
      },
    },
  ],
}
