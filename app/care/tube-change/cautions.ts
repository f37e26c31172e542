/** What must be read wherever a tube is shown or charted. */
export const tubeCautions = [
  'Sizes from different makers are not equal. Read the flange. Compare outside and inside diameter and length.',
  'Use only the inner cannula made for this tube.',
] as const
