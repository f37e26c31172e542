import { numberSetting } from '../policy.ts'

export const depthPastTip = numberSetting({
  name: 'suction-depth-past-tip',
  label: 'A suction catheter passes the end of the tube by',
  unit: 'mm',
  default: 5,
  min: 0,
  max: 20,
  affects: 'Bed-head sign: the depth of suction that it prints.',
  source: {
    says: 'NTSP, suction to a measured depth: length of the tube and 0.5 cm; given there for children',
    standing: 'published',
  },
})
