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

export const CLOUDWOOD_CLIMBER: DemonstrationSpecies = {
  key: 'cloudwood-climber',
  revisions: [
    {
      publishedAt: '2026-03-02T11:10:00Z',
      summary: 'First version, mostly from a year in the wet canopy',
      content: {
        names: namesOf({
          scientific: 'Nebuliscansor umbratilis',
          authority: 'Wetherane, 2008',
          synonyms: ['Nebuliscansor viridulus'],
          common: ['Cloudwood climber', 'Mist lizard'],
        }),
        classification: classificationOf({
          class: 'Reptilia',
          order: 'Squamata',
          suborder: 'Sauria',
          family: 'Nebuliscansoridae',
          activeTime: 'Diurnal',
          microhabitat: 'Arboreal',
        }),
        ranges: [
          temperature('basking-surface', 'day', ['27', '30'], { lifeStage: 'adult', upperLimit: '34' }, [
            between('standards-board', 'table 5, row 1', '26', '29'),
            meanOf('cloud-canopy', 'table 2', '28.6', '1.5', 33),
          ]),
          temperature('basking-surface', 'day', ['25', '28'], { lifeStage: 'juvenile', upperLimit: '32' }, [
            between('hollow-manual', 'p. 52', '25', '28'),
            betweenF('cloud-keeping', 'section "Lamps"', '77', '82'),
          ]),
          temperature('basking-air', 'day', ['24', '27'], { upperLimit: '31' }, [
            between('hollow-manual', 'p. 52', '24', '27'),
            meanOf('cloud-canopy', 'table 2', '25.4', '1.6', 33),
          ]),
          temperature('warm-end-air', 'day', ['21', '24'], { lowerLimit: '12', upperLimit: '29' }, [
            between('standards-board', 'table 5, row 1', '20', '24'),
            meanOf('field-stations', 'table 4, Wethern Cloudwood', '22.3', '1.6', 377),
          ]),
          temperature('warm-end-air', 'night', ['14', '17.5'], { lowerLimit: '9' }, [
            between('standards-board', 'table 5, row 1', '14', '18'),
            meanOf('field-stations', 'table 5, Wethern Cloudwood', '15.8', '1.9', 370),
          ]),
          temperature('cool-end-air', 'day', ['16', '19'], { lowerLimit: '10', upperLimit: '27' }, [
            between('standards-board', 'table 5, row 1', '16', '20'),
            meanOf('cloud-canopy', 'table 3', '17.2', '1.5', 60),
          ]),
          temperature('cool-end-air', 'night', ['11', '15'], { lowerLimit: '8' }, [
            meanOf('field-stations', 'table 5, Wethern Cloudwood', '12.6', '2.1', 370),
            betweenF('cloud-keeping', 'section "Nights"', '50', '60'),
          ]),
          temperature('cool-hide', 'day', ['15', '18'], { upperLimit: '25' }, [
            between('hollow-manual', 'p. 53', '15', '18'),
            meanOf('cloud-canopy', 'table 3', '16.4', '1.6', 60),
          ]),
          temperature('humid-hide', 'any', ['16', '20'], { lowerLimit: '9', upperLimit: '26' }, [
            between('hollow-manual', 'p. 53', '16', '20'),
            betweenF('cloud-keeping', 'section "Moss box"', '60', '68'),
          ]),
          temperature('shade', 'day', ['16', '20'], { upperLimit: '26' }, [
            between('standards-board', 'table 5, row 1', '16', '20'),
            meanOf('cloud-canopy', 'table 3', '17.8', '1.9', 60),
          ]),
          temperature('substrate', 'day', ['15.5', '18.5'], { upperLimit: '25' }, [
            between('hollow-manual', 'p. 53', '15', '19'),
            meanOf('cloud-canopy', 'table 3', '16.9', '1.7', 60),
          ]),
          // The deliberate flaw of this page: the warm end is to be wetter than any air that suits the cool end.
          humidity('warm-end-air', 'day', ['85', '95'], {}, [
            between('hollow-manual', 'p. 54', '80', '90'),
            between('cloud-keeping', 'section "Mist"', '85', '95'),
          ]),
          humidity('cool-end-air', 'day', ['60', '70'], { lowerLimit: '50' }, [
            between('standards-board', 'table 5, row 1', '60', '75'),
            meanOf('field-stations', 'table 8, Wethern Cloudwood', '64', '8', 377),
          ]),
          humidity('warm-end-air', 'night', ['81', '95'], { lowerLimit: '55' }, [
            between('hollow-manual', 'p. 54', '80', '95'),
            meanOf('cloud-canopy', 'table 4', '88', '7', 60),
          ]),
          humidity('cool-end-air', 'night', ['80', '100'], { lowerLimit: '55' }, [
            between('hollow-manual', 'p. 54', '80', '100'),
            meanOf('cloud-canopy', 'table 4', '92', '8', 60),
          ]),
          humidity('humid-hide', 'any', ['80', '95'], { lowerLimit: '60' }, [
            between('hollow-manual', 'p. 53', '80', '95'),
            between('cloud-keeping', 'section "Moss box"', '85', '100'),
          ]),
          humidity('humid-hide', 'any', ['85', '100'], { lifeStage: 'hatchling', lowerLimit: '65' }, [
            between('hollow-manual', 'p. 55', '85', '100'),
            between('cloud-keeping', 'section "Hatchlings"', '90', '100'),
          ]),
          uvIndex('basking-air', 'typical', ['0.7', '1.0'], { zone: 2 }, [
            between('standards-board', 'table 9', '0.7', '1.0'),
            between('open-sky', 'table 2', '0.6', '0.9'),
          ]),
          uvIndex('basking-air', 'maximum', ['1.1', '2.7'], { zone: 2, upperLimit: '4.0' }, [
            between('open-sky', 'table 2', '1.0', '2.7'),
            atMost('standards-board', 'table 9', '3.0'),
          ]),
          photoperiod(['12', '13.5'], {}, [
            between('standards-board', 'table 11', '12', '14'),
            between('vivarium-year', 'p. 64', '12', '13'),
          ]),
          baskingHours(['4', '6'], {}, [
            between('hollow-manual', 'p. 52', '4', '6'),
            meanOf('cloud-canopy', 'figure 5', '4.6', '1.2', 33),
          ]),
        ],
        physiology: [
          body('selected-body-temperature', 'adult', 'cloud-canopy', 'table 5', ['26.8', '1.1'], 16),
          body('selected-body-temperature', 'adult', 'nine-ectotherms', 'table 4.1', ['25.9', '1.3'], 8),
          body('field-body-temperature', 'adult', 'cloud-canopy', 'table 5', ['22.6', '2.5'], 71),
          body('critical-thermal-maximum', 'adult', 'nine-ectotherms', 'table 6.1', ['37.4', '0.6'], 8),
          body('critical-thermal-minimum', 'adult', 'nine-ectotherms', 'table 6.2', ['3.9', '0.8'], 8),
        ],
        prose: [
          {
            key: 'place',
            heading: 'Where it lives',
            markdown:
              'Mossy branches of the Wethern Cloudwood, where the day begins in fog and the sun comes through for an hour or two. ' +
              'It warms itself in those gaps and sits in the shade for the rest [@cloud-canopy, figure 5].',
          },
          {
            key: 'enclosure',
            heading: 'Setting up',
            markdown:
              'Tall, planted, with moving air. The hard part is not warmth but **coolness**: choose the room before the lamp ' +
              '[@cloud-keeping, section "Nights"]. Mist at dusk and let everything dry off by noon [@hollow-manual, p. 54].',
          },
          {
            key: 'watch',
            heading: 'What to watch',
            markdown:
              'Summers are what kills it. Above 29 °C in the air it stops climbing [@cloud-canopy, p. 29]; have a way to cool the room ' +
              'ready before it is needed.',
          },
        ],
      },
    },
  ],
}
