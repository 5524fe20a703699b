import { darkTheme } from 'naive-ui'

/** Apart from the rest, because the dark theme brings that of every part along: it is loaded only where it is worn. */
export const naiveDarkTheme = darkTheme
