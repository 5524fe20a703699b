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
  value,
} from './build.js'
import type { DemonstrationContent, DemonstrationRange, DemonstrationSpecies } from './content.js'

const active = { season: 'active' } as const
const brumation = { season: 'brumation' } as const

const summer: DemonstrationRange[] = [
  temperature('basking-surface', 'day', ['30', '34'], { ...active, upperLimit: '40' }, [
    between('standards-board', 'table 6, row 1', '29', '33'),
    meanOf('fen-snakes', 'table 2', '32.1', '2.1', 46),
  ]),
  temperature(
    'basking-surface',
    'day',
    ['31.5', '34'],
    { ...active, lifeStage: 'gravid', upperLimit: '39', note: 'Gravid females bask for most of the day.' },
    [meanOf('fen-snakes', 'table 2', '32.6', '1.4', 9), betweenF('rimeback-breeding', 'brood 4', '88', '93')],
  ),
  temperature('basking-air', 'day', ['27', '30'], { ...active, upperLimit: '35' }, [
    between('hollow-manual', 'p. 61', '26', '30'),
    meanOf('fen-snakes', 'table 2', '28.4', '1.8', 46),
  ]),
  temperature('warm-end-air', 'day', ['25', '28'], { ...active, lowerLimit: '12', upperLimit: '34' }, [
    between('standards-board', 'table 6, row 1', '24', '28'),
    meanOf('field-stations', 'table 4, Hollin Fen', '26.0', '1.7', 390),
  ]),
  temperature(
    'warm-end-air',
    'day',
    ['24', '27'],
    { ...active, lifeStage: 'juvenile', lowerLimit: '14', upperLimit: '32' },
    [
      between('standards-board', 'table 6, row 2', '24', '27'),
      betweenF('rimeback-breeding', 'brood 6', '76', '80'),
    ],
  ),
  temperature('warm-end-air', 'night', ['16', '19.5'], { ...active, lowerLimit: '9' }, [
    between('standards-board', 'table 6, row 1', '16', '20'),
    meanOf('field-stations', 'table 5, Hollin Fen', '17.5', '2.0', 381),
  ]),
  temperature('cool-end-air', 'day', ['18', '22'], { ...active, lowerLimit: '9', upperLimit: '30' }, [
    between('standards-board', 'table 6, row 1', '18', '22'),
    betweenF('circle-returns', 'question 8', '65', '72'),
  ]),
  temperature('cool-end-air', 'night', ['13', '17'], { ...active, lowerLimit: '8' }, [
    between('standards-board', 'table 6, row 1', '12', '17'),
    meanOf('field-stations', 'table 5, Hollin Fen', '14.8', '2.2', 381),
    value('nine-ectotherms', 'table 6.2', '2.6', { kind: 'tolerance-limit', n: 9 }),
  ]),
  temperature('warm-hide', 'day', ['26', '28.5'], { ...active, upperLimit: '34' }, [
    between('hollow-manual', 'p. 62', '26', '29'),
    betweenF('rimeback-breeding', 'brood 1', '78', '84'),
  ]),
  temperature('cool-hide', 'day', ['18', '21'], { ...active, upperLimit: '27' }, [
    between('hollow-manual', 'p. 62', '18', '21'),
    meanOf('fen-snakes', 'table 3', '19.4', '1.8', 46),
  ]),
  temperature('humid-hide', 'any', ['20', '24'], { ...active, upperLimit: '29' }, [
    between('hollow-manual', 'p. 63', '20', '24'),
    betweenF('rimeback-breeding', 'brood 1', '70', '76'),
  ]),
  temperature('shade', 'day', ['18', '22'], { ...active, upperLimit: '28' }, [
    between('standards-board', 'table 6, row 1', '17', '22'),
    meanOf('field-stations', 'table 6, Hollin Fen', '20.1', '2.1', 390),
  ]),
  temperature('substrate', 'day', ['19.5', '23'], { ...active, upperLimit: '29' }, [
    between('hollow-manual', 'p. 63', '19', '24'),
    meanOf('fen-snakes', 'table 3', '21.3', '2.1', 46),
  ]),
  humidity('warm-end-air', 'day', ['45', '65'], { ...active, upperLimit: '85' }, [
    between('standards-board', 'table 6, row 1', '45', '65'),
    meanOf('field-stations', 'table 8, Hollin Fen', '54', '10', 390),
  ]),
  // The deliberate flaw of this page: a juvenile by night is answered by both of these rows.
  humidity('cool-end-air', 'night', ['61', '79'], { ...active, upperLimit: '95' }, [
    between('standards-board', 'table 6, row 1', '60', '80'),
    meanOf('field-stations', 'table 8, Hollin Fen', '70', '9', 381),
  ]),
  humidity('cool-end-air', 'any', ['65', '80'], { ...active, lifeStage: 'juvenile', upperLimit: '95' }, [
    between('hollow-manual', 'p. 64', '65', '80'),
    atLeast('rimeback-breeding', 'brood 6', '65'),
  ]),
  humidity('humid-hide', 'any', ['75', '90'], { ...active, lowerLimit: '50' }, [
    between('hollow-manual', 'p. 63', '75', '90'),
    between('rimeback-breeding', 'brood 1', '70', '85'),
  ]),
  uvIndex('basking-air', 'typical', ['0.7', '1.0'], { ...active, zone: 2 }, [
    between('standards-board', 'table 9', '0.7', '1.0'),
    between('open-sky', 'table 2', '0.5', '0.9'),
  ]),
  uvIndex('basking-air', 'maximum', ['1.1', '2.5'], { ...active, zone: 2, upperLimit: '4.0' }, [
    between('open-sky', 'table 2', '1.1', '2.5'),
    atMost('standards-board', 'table 9', '3.0'),
  ]),
  photoperiod(['13', '15'], active, [
    between('standards-board', 'table 11', '13', '15'),
    between('vivarium-year', 'p. 66', '12', '15'),
  ]),
  baskingHours(['6', '9'], active, [
    between('hollow-manual', 'p. 61', '6', '9'),
    meanOf('fen-snakes', 'figure 3', '7.1', '1.6', 46),
  ]),
]

const winter: DemonstrationRange[] = [
  temperature('whole-enclosure', 'any', ['5', '8'], { ...brumation, lowerLimit: '2', upperLimit: '12' }, [
    between('standards-board', 'table 7', '4', '8'),
    meanOf('fen-snakes', 'table 6', '6.1', '1.6', 12),
    betweenF('rimeback-breeding', 'winter 3', '40', '46'),
  ]),
  temperature(
    'whole-enclosure',
    'any',
    ['6', '9'],
    { ...brumation, lifeStage: 'juvenile', lowerLimit: '3', upperLimit: '12' },
    [between('standards-board', 'table 7', '5', '9'), between('hollow-manual', 'p. 66', '6', '9')],
  ),
  humidity('cool-hide', 'any', ['75', '90'], { ...brumation, lowerLimit: '50' }, [
    between('hollow-manual', 'p. 66', '70', '90'),
    meanOf('fen-snakes', 'table 6', '83', '8', 12),
  ]),
  photoperiod(['0', '8'], brumation, [
    between('standards-board', 'table 11', '0', '8'),
    atMost('vivarium-year', 'p. 67', '8'),
  ]),
]

const first: DemonstrationContent = {
  names: namesOf({
    scientific: 'Pruinophis hollinensis',
    authority: 'Fenn, 2001',
    synonyms: ['Pruinophis griseus'],
    common: ['Rimeback snake', 'Fen rimeback'],
  }),
  classification: classificationOf({
    class: 'Reptilia',
    order: 'Squamata',
    suborder: 'Serpentes',
    family: 'Pruinophiidae',
    activeTime: 'Diurnal',
    microhabitat: 'Terrestrial',
  }),
  ranges: summer,
  physiology: [
    body('selected-body-temperature', 'adult', 'fen-snakes', 'table 4', ['29.8', '1.3'], 20),
    body('selected-body-temperature', 'adult', 'nine-ectotherms', 'table 4.1', ['28.7', '1.6'], 9),
    body('selected-body-temperature', 'gravid', 'fen-snakes', 'table 4', ['30.9', '0.8'], 7),
    body('field-body-temperature', 'adult', 'fen-snakes', 'table 3', ['25.4', '3.0'], 88),
    body('critical-thermal-maximum', 'adult', 'nine-ectotherms', 'table 6.1', ['41.2', '0.9'], 9),
    body('critical-thermal-minimum', 'adult', 'nine-ectotherms', 'table 6.2', ['2.6', '0.7'], 9),
  ],
  prose: [
    {
      key: 'place',
      heading: 'Where it lives',
      markdown:
        'Sedge and old peat banks of the Hollin Fen. From the first frosts until the thaw it lies in frost-free dens, often ' +
        'several together, at five to eight degrees [@fen-snakes, table 6].',
    },
    {
      key: 'enclosure',
      heading: 'Setting up',
      markdown:
        'A basking place by day, a real fall of temperature by night, and a damp retreat that is **not** under the lamp ' +
        '[@hollow-manual, p. 62]. Lock what slides: it leans on everything.',
    },
    {
      key: 'watch',
      heading: 'What to watch',
      markdown:
        'Do not feed within two weeks of the cool season, and weigh before and after [@rimeback-breeding, winter 3]. A snake that ' +
        'wakes and wanders in winter is too warm or ill: ask a veterinarian.',
    },
  ],
}

export const RIMEBACK_SNAKE: DemonstrationSpecies = {
  key: 'rimeback-snake',
  revisions: [
    { publishedAt: '2026-03-16T07:55:00Z', summary: 'First version, the active season only', content: first },
    {
      publishedAt: '2026-09-07T12:00:00Z',
      summary: 'Brumation added for adults and juveniles, with den temperatures from the field',
      content: { ...first, ranges: [...summer, ...winter] },
    },
  ],
}
