import {
  atLeast,
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

export const HUSH_GECKO: DemonstrationSpecies = {
  key: 'hush-gecko',
  revisions: [
    {
      publishedAt: '2026-02-16T09:00:00Z',
      summary: 'First version, from two field studies and the care manual',
      content: {
        names: namesOf({
          scientific: 'Rupivigil tacitus',
          authority: 'Hask, 2004',
          synonyms: ['Rupivigil ninefoldi'],
          common: ['Hush gecko', 'Ninefold crevice gecko'],
        }),
        classification: classificationOf({
          class: 'Reptilia',
          order: 'Squamata',
          suborder: 'Sauria',
          family: 'Rupivigilidae',
          activeTime: 'Nocturnal',
          microhabitat: 'Saxicolous',
        }),
        ranges: [
          temperature('basking-surface', 'day', ['29', '32'], { upperLimit: '40' }, [
            between('standards-board', 'table 4, row 1', '28', '32'),
            meanOf('night-rock', 'table 2', '30.4', '1.6', 37),
          ]),
          temperature('basking-air', 'day', ['28', '30'], { upperLimit: '36' }, [
            between('hollow-manual', 'p. 43', '27', '30'),
            meanOf('night-rock', 'table 2', '29.2', '1.5', 37),
          ]),
          // The deliberate flaw of this page: a hide on a heated slab, warmer than the place to bask.
          temperature('warm-hide', 'day', ['31.5', '33'], { lifeStage: 'adult', upperLimit: '38' }, [
            meanOf('night-rock', 'table 3', '32.6', '1.5', 29),
            betweenF('gecko-notes', 'part 2', '88', '92'),
          ]),
          temperature('warm-hide', 'day', ['29', '31'], { lifeStage: 'juvenile', upperLimit: '36' }, [
            between('standards-board', 'table 4, row 2', '28', '31'),
            betweenF('gecko-notes', 'part 3', '85', '88'),
          ]),
          temperature('warm-hide', 'night', ['24', '27'], { lowerLimit: '16' }, [
            meanOf('night-rock', 'table 3', '25.5', '2.0', 29),
            betweenF('gecko-notes', 'part 2', '75', '82'),
          ]),
          temperature('warm-end-air', 'day', ['27', '30'], { lowerLimit: '16', upperLimit: '35' }, [
            between('standards-board', 'table 4, row 1', '26', '30'),
            meanOf('field-stations', 'table 4, Ninefold Scarp', '28.0', '1.8', 405),
          ]),
          temperature('warm-end-air', 'night', ['20', '24'], { lowerLimit: '15' }, [
            between('standards-board', 'table 4, row 1', '20', '24'),
            meanOf('field-stations', 'table 5, Ninefold Scarp', '21.4', '2.4', 401),
          ]),
          temperature('cool-end-air', 'day', ['23', '26'], { lowerLimit: '15', upperLimit: '33' }, [
            between('standards-board', 'table 4, row 1', '22', '26'),
            meanOf('field-stations', 'table 4, Ninefold Scarp', '24.2', '1.7', 405),
          ]),
          temperature('cool-end-air', 'night', ['18', '22'], { lowerLimit: '14' }, [
            between('standards-board', 'table 4, row 1', '18', '22'),
            betweenF('circle-returns', 'question 8', '65', '72'),
          ]),
          temperature('cool-hide', 'day', ['23', '26'], { upperLimit: '32' }, [
            meanOf('night-rock', 'table 3', '24.4', '1.9', 29),
            between('hollow-manual', 'p. 44', '22', '25'),
          ]),
          temperature('cool-hide', 'night', ['18.5', '22'], { lowerLimit: '14' }, [
            meanOf('night-rock', 'table 3', '20.1', '1.8', 29),
            between('hollow-manual', 'p. 44', '18', '22'),
          ]),
          temperature('humid-hide', 'any', ['25', '28.5'], { lowerLimit: '16', upperLimit: '33' }, [
            between('hollow-manual', 'p. 45', '25', '28'),
            betweenF('gecko-notes', 'part 4', '78', '84'),
          ]),
          temperature('shade', 'day', ['23', '26'], { upperLimit: '32' }, [
            between('standards-board', 'table 4, row 1', '22', '26'),
            meanOf('field-stations', 'table 6, Ninefold Scarp', '24.6', '1.9', 405),
          ]),
          temperature('substrate', 'day', ['24', '27'], { lowerLimit: '15', upperLimit: '33' }, [
            between('hollow-manual', 'p. 45', '24', '27'),
            meanOf('field-stations', 'table 7, Ninefold Scarp', '25.3', '2.0', 405),
          ]),
          temperature(
            'substrate',
            'any',
            ['27', '28.5'],
            { lifeStage: 'egg', lowerLimit: '22', upperLimit: '33', note: 'Of the medium the eggs lie in.' },
            [between('hollow-manual', 'p. 48', '27', '29'), betweenF('gecko-notes', 'part 5', '80', '84')],
          ),
          humidity('humid-hide', 'any', ['70', '85'], { lifeStage: 'adult', lowerLimit: '45' }, [
            between('hollow-manual', 'p. 45', '70', '85'),
            between('gecko-notes', 'part 4', '65', '80'),
          ]),
          humidity('humid-hide', 'any', ['75', '90'], { lifeStage: 'juvenile', lowerLimit: '55' }, [
            between('hollow-manual', 'p. 45', '75', '90'),
            atLeast('gecko-notes', 'part 4', '75'),
          ]),
          humidity('warm-end-air', 'day', ['25', '45'], { upperLimit: '70' }, [
            between('hollow-manual', 'p. 43', '25', '45'),
            meanOf('field-stations', 'table 8, Ninefold Scarp', '33', '9', 405),
          ]),
          humidity('cool-end-air', 'day', ['30', '50'], { upperLimit: '75' }, [
            between('standards-board', 'table 4, row 1', '30', '50'),
            meanOf('field-stations', 'table 8, Ninefold Scarp', '38', '10', 405),
          ]),
          humidity('cool-end-air', 'night', ['45', '65'], { upperLimit: '85' }, [
            between('standards-board', 'table 4, row 1', '45', '60'),
            meanOf('field-stations', 'table 8, Ninefold Scarp', '55', '12', 401),
          ]),
          uvIndex('basking-air', 'typical', ['0', '0.7'], { zone: 1 }, [
            between('open-sky', 'table 2', '0.1', '0.6'),
            atMost('standards-board', 'table 9', '0.7'),
          ]),
          uvIndex('basking-air', 'maximum', ['0.6', '1.4'], { zone: 1, upperLimit: '2.5' }, [
            between('open-sky', 'table 2', '0.6', '1.7'),
            atMost('standards-board', 'table 9', '1.4'),
          ]),
          photoperiod(['12', '13'], {}, [
            between('standards-board', 'table 11', '12', '13'),
            between('vivarium-year', 'p. 61', '11', '13'),
          ]),
          baskingHours(['10', '12'], {}, [
            between('hollow-manual', 'p. 46', '10', '12'),
            between('gecko-notes', 'part 2', '8', '12'),
          ]),
        ],
        physiology: [
          body('selected-body-temperature', 'adult', 'night-rock', 'table 5', ['33.6', '1.2'], 18),
          body('selected-body-temperature', 'adult', 'nine-ectotherms', 'table 4.1', ['32.9', '1.4'], 10),
          body('field-body-temperature', 'adult', 'night-rock', 'table 4', ['24.2', '3.1'], 40),
          body('critical-thermal-maximum', 'adult', 'nine-ectotherms', 'table 6.1', ['42.3', '0.8'], 10),
          body('critical-thermal-minimum', 'adult', 'nine-ectotherms', 'table 6.2', ['9.8', '1.1'], 10),
        ],
        prose: [
          {
            key: 'place',
            heading: 'Where it lives',
            markdown:
              'Cracks in the limestone of the Ninefold Scarp, never more than two body lengths deep. The rock gives back after ' +
              'dusk what it took by day, and the gecko hunts on it until it has cooled to about 20 °C [@night-rock, figure 4].',
          },
          {
            key: 'enclosure',
            heading: 'Setting up',
            markdown:
              'Stack flat stones so that one crack is warm and the next is not, and **fix them** so that nothing can slide. Heat the ' +
              'upper slab from above by day [@hollow-manual, p. 43]. Keep one crack moist with a wick [@gecko-notes, part 4].',
          },
          {
            key: 'watch',
            heading: 'What to watch',
            markdown:
              'It sheds at night and eats the skin; what stays behind stays on the toes. Seen by day in the open, it is too cold, too ' +
              'dry or being chased [@hollow-manual, p. 47].',
          },
        ],
      },
    },
  ],
}
