/** Every colour of the product, by theme. Nothing else in the client writes a colour down; a test sees to it. */
export interface ColourTokens {
  /** Ground of a page. */
  paper: string
  /** Ground of what lies on the page: fields, panels. */
  card: string
  ink: string
  muted: string
  line: string
  /** Edge of a field or control that must be seen by itself (3 : 1 against paper and card). */
  edge: string
  /** Primary: links in focus, the good mark, the brand. */
  moss: string
  mossWash: string
  /** Heat. */
  ember: string
  emberWash: string
  /** Humidity. */
  lagoon: string
  lagoonWash: string
  /** Ultraviolet. */
  iris: string
  irisWash: string
  /** Light, hours, and what is invented. */
  straw: string
  strawWash: string
  /** Neutral ground behind a note. */
  wash: string
  /** Limits, and what must not be missed. */
  danger: string
  dangerWash: string
  /** Cast under what floats. */
  shadow: string
}

export const lightColours: ColourTokens = {
  paper: '#faf8f3',
  card: '#ffffff',
  ink: '#23271f',
  muted: '#5c6357',
  line: '#ddd8cb',
  edge: '#8b8d7c',
  moss: '#3c6a3f',
  mossWash: '#dfe9d8',
  ember: '#b1471b',
  emberWash: '#f3ddd0',
  lagoon: '#1c6c78',
  lagoonWash: '#d5e6e6',
  iris: '#5a4aa6',
  irisWash: '#e1dcf0',
  straw: '#8a6510',
  strawWash: '#efe4c6',
  wash: '#f1ede2',
  danger: '#9c1f2e',
  dangerWash: '#f4dadb',
  shadow: 'rgb(35 39 31 / 14%)',
}

export const darkColours: ColourTokens = {
  paper: '#171a15',
  card: '#1f231d',
  ink: '#e9e7de',
  muted: '#a3a998',
  line: '#363b32',
  edge: '#70776a',
  moss: '#8fc08d',
  mossWash: '#23331f',
  ember: '#ef9a6f',
  emberWash: '#4a2a1b',
  lagoon: '#7cc3cc',
  lagoonWash: '#17393d',
  iris: '#b3a6f0',
  irisWash: '#312a55',
  straw: '#dcb860',
  strawWash: '#41340f',
  wash: '#252a22',
  danger: '#f08b93',
  dangerWash: '#471e23',
  shadow: 'rgb(0 0 0 / 50%)',
}

export const fontFamily =
  "'Fira Sans', 'Fira Sans Stand-in', 'Fira Sans Wide Stand-in', system-ui, sans-serif"

/** Sizes that several components share, written as CSS lengths. */
export const sizeTokens = {
  /** Widest content of a page, its padding left out. */
  page: '1176px',
  /** Longest line of running text. */
  measure: '68ch',
  /** Side padding of a page. */
  gutter: 'clamp(16px, 4vw, 32px)',
  /** Height of a field or button that a wet finger must meet. */
  control: '44px',
  controlSmall: '36px',
  radius: '10px',
  radiusSmall: '6px',
  radiusLarge: '14px',
}
