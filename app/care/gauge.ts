/** The band that a number is shown against while it is typed. */
export interface Gauge {
  readonly field: string
  readonly unitField?: string
  readonly lower: number
  readonly upper: number
  readonly max: number
  readonly unit: string
}
