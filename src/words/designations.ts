/**
 * Names that other countries' standards have for rows of the materials table. From memory: the
 * nearest grade, not the same sheet. The card says which row was taken.
 */
export const DESIGNATIONS: readonly (readonly [names: string, id: string])[] = [
  ['c15|1.0401|s15c|s20c|en3|en3b|080a15', 'steel-lowC-CD'],
  ['1.0715|9smn28|sum22|sum23|en1a|230m07', 'steel-free-S'],
  ['1.0718|9smnpb28|sum24l|en1apb|en1a leaded|230m07pb', 'steel-free-Pb'],
  ['1.0503|1.1191|c45e|s45c|en8|080m40', 'steel-medC-CD'],
  ['1.2510|100mncrw4|sks3', 'tool-O1-ann'],
  ['1.2379|x153crmov12|skd11', 'tool-D2-ann'],
  ['1.4305|sus303|x8crnis18-9', 'ss303'],
  ['1.4301|1.4307|sus304|sus304l|x5crni18-10', 'ss304'],
  ['1.4401|1.4404|sus316|sus316l', 'ss316'],
  ['1.4005|sus416|x12crs13', 'ss416'],
  ['1.4542|sus630|x5crnicunb16-4', 'ss17-4-A'],
  ['a6061|almg1sicu', 'al6061-T6'],
  ['a2011|alcu6bipb', 'al2011-T3'],
  ['a2024|alcu4mg1', 'al2024-T351'],
  ['a7075|alznmgcu1.5', 'al7075-T6'],
  ['cz121|cw603n|cw614n|cuzn36pb3|cuzn39pb3|c3604|ms58', 'brass360'],
  ['cw508l|cuzn30', 'brass260'],
  ['cw004a|cu-etp', 'copper110'],
  ['gjl-200|en-gjl-200|gg20|gg-20|fc200', 'iron-grey30'],
  ['gjs-450-10|en-gjs-450-10|fcd450', 'iron-ductile65'],
  ['3.7035', 'ti-cp2'],
  ['3.7165', 'ti-6-4'],
];

/** A number of this form is a diameter to an inch shop and a material to a metric one. */
export const LOOKS_LIKE_A_SIZE = /^\d\.\d{4}$/u;
