import type { GlobalThemeOverrides } from 'naive-ui'
import { darkColours, fontFamily, lightColours, type ColourTokens } from './tokens.js'

/** Naive UI reckons with colours, so it is given the concrete values behind our custom properties. */
function toOverrides(colours: ColourTokens): GlobalThemeOverrides {
  return {
    common: {
      fontFamily,
      fontFamilyMono: fontFamily,
      fontSize: '16px',
      fontSizeMedium: '16px',
      fontSizeLarge: '16px',
      heightMedium: '44px',
      heightLarge: '44px',
      borderRadius: '10px',
      bodyColor: colours.paper,
      cardColor: colours.card,
      modalColor: colours.card,
      popoverColor: colours.card,
      inputColor: colours.card,
      inputColorDisabled: colours.wash,
      actionColor: colours.wash,
      hoverColor: colours.wash,
      textColorBase: colours.ink,
      textColor1: colours.ink,
      textColor2: colours.ink,
      textColor3: colours.muted,
      placeholderColor: colours.muted,
      iconColor: colours.muted,
      borderColor: colours.edge,
      dividerColor: colours.line,
      primaryColor: colours.moss,
      primaryColorHover: colours.moss,
      primaryColorPressed: colours.moss,
      primaryColorSuppl: colours.moss,
      errorColor: colours.danger,
      errorColorHover: colours.danger,
      errorColorPressed: colours.danger,
      errorColorSuppl: colours.danger,
      warningColor: colours.straw,
      warningColorHover: colours.straw,
      warningColorPressed: colours.straw,
      warningColorSuppl: colours.straw,
      infoColor: colours.lagoon,
      infoColorHover: colours.lagoon,
      infoColorPressed: colours.lagoon,
      infoColorSuppl: colours.lagoon,
      successColor: colours.moss,
      successColorHover: colours.moss,
      successColorPressed: colours.moss,
      successColorSuppl: colours.moss,
    },
  }
}

export const lightOverrides = toOverrides(lightColours)
export const darkOverrides = toOverrides(darkColours)
