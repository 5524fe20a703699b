import type { RequestHandler } from 'express'
import type { LengthUnit, TemperatureUnit } from '../../shared/units.js'

/** What a reader chose to see pages in; the server renders in it. */
export interface Preferences {
  temperatureUnit: TemperatureUnit
  lengthUnit: LengthUnit
  theme: 'light' | 'dark' | 'system'
}

export interface RenderInput {
  /** Answers a read by its path below /api/v1, query included; throws an `AppError`. */
  read: (apiPath: string) => Promise<unknown>
  preferences: Preferences
  /** The origin readers see, for canonical addresses. */
  origin: string
}

/** What the client's server entry gives for one address. */
export interface RenderedPage {
  status: number
  /** Where the reader is sent instead, else null. */
  location: string | null
  /** Markup for inside `#app`. */
  html: string
  headTags: string
  htmlAttrs: string
  bodyAttrs: string
  /** JSON that is safe inside a script element. */
  state: string
  /** `<style>` elements for the head. */
  css: string
  /** Whether the page depends on its address, the preferences and the published data alone. */
  cacheable: boolean
  /** Modules the page used, by the names the build's manifest gives them. */
  modules: string[]
}

/** A whole page, ready to be sent. */
export interface PageDocument {
  status: number
  location: string | null
  html: string
  cacheable: boolean
}

/** Turns an address into a page, and serves the files that page asks for. */
export interface PageRenderer {
  /** Tells this build from any other; pages cached for one are not sent for another. */
  buildId: string
  /** Answers with the client's scripts, styles and fonts, and passes on what it does not have. */
  files: RequestHandler
  /** Renders the page at `url` (path and query). */
  render(url: string, input: RenderInput): Promise<PageDocument>
  /** Lets go of whatever it holds open. */
  close(): Promise<void>
}

/** The module that the client builds for the server. */
export interface ServerEntry {
  render(url: string, input: RenderInput): Promise<RenderedPage>
}
