/**
 * What lies at the bedside of somebody with a tracheostomy: the union of St George's NHS, NHS Greater Glasgow and Clyde, and NSW ACI.
 * What does not apply, such as a stitch cutter without sutures, counts as there.
 */
export const kitItems = {
  suction: 'Working suction and tubing',
  catheters: 'Suction catheters, right size',
  'oral sucker': 'Rigid oral sucker',
  oxygen: 'Oxygen, face mask and stoma mask',
  bag: 'Bag-valve-mask with reservoir',
  'spare same': 'Spare tube, same size',
  'spare smaller': 'Spare tube, one size smaller',
  'spare cuffed': 'Cuffed tube, same size',
  obturator: 'Obturator',
  'inner cannula': 'Spare inner cannula, matching and plain',
  dilators: 'Tracheal dilators',
  scissors: 'Scissors and stitch cutter',
  syringe: '10 mL syringe',
  manometer: 'Cuff manometer',
  gel: 'Water-soluble gel',
  ties: 'Spare ties and dressing',
  wedge: 'Disconnection wedge',
  protection: 'Gloves, apron, eye protection',
  bell: 'Call bell and communication aid',
  water: 'Sterile water or saline',
  stethoscope: 'Stethoscope',
  sign: 'Bed-head sign and emergency algorithm',
} as const

export type KitItem = keyof typeof kitItems

/** The same inside a sentence: `Get a spare tube of the same size now.` */
export const itemWords: Readonly<Record<KitItem, string>> = {
  suction: 'working suction',
  catheters: 'suction catheters of the right size',
  'oral sucker': 'a rigid oral sucker',
  oxygen: 'oxygen with a face mask and a stoma mask',
  bag: 'a bag-valve-mask with reservoir',
  'spare same': 'a spare tube of the same size',
  'spare smaller': 'a spare tube one size smaller',
  'spare cuffed': 'a cuffed tube of the same size',
  obturator: 'an obturator',
  'inner cannula': 'a matching spare inner cannula',
  dilators: 'tracheal dilators',
  scissors: 'scissors and a stitch cutter',
  syringe: 'a 10 mL syringe',
  manometer: 'a cuff manometer',
  gel: 'water-soluble gel',
  ties: 'spare ties and a dressing',
  wedge: 'a disconnection wedge',
  protection: 'gloves, apron and eye protection',
  bell: 'a call bell and a communication aid',
  water: 'sterile water or saline',
  stethoscope: 'a stethoscope',
  sign: 'the bed-head sign and the emergency algorithm',
}
