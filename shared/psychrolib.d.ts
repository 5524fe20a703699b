/** The part of psychrolib 1.1.1 (MIT) that the product calls; the package has no types of its own. */
declare module 'psychrolib' {
  interface Psychrolib {
    readonly SI: number
    SetUnitSystem(unitSystem: number): void
    /** Pa, from °C in −100 to 200; over ice at and below 0.01 °C. */
    GetSatVapPres(dryBulbC: number): number
  }
  const psychrolib: Psychrolib
  export = psychrolib
}
