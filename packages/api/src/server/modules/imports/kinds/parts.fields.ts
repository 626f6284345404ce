import type { Side } from '../../../../contract/access'
import type { Field } from '../rows/fields'

const partner = {
  supplier: {
    label: 'Customer',
    hint: 'Name of the customer as it stands in your list. Needed only where you supply several.',
    example: 'Nordhof Drives',
    names: ['customer', 'customer name', 'kunde', 'client', 'cliente'],
  },
  customer: {
    label: 'Supplier',
    hint: 'Name of the supplier as it stands in your list. Needed only where several supply you.',
    example: 'Halm Turning',
    names: ['supplier', 'supplier name', 'vendor', 'lieferant', 'fournisseur', 'proveedor', 'fornitore'],
  },
} satisfies Record<Side, Pick<Field, 'label' | 'hint' | 'example' | 'names'>>

const numberNames = [
  ...['part number', 'part no', 'part', 'part id', 'item number', 'material number'],
  ...['teilenummer', 'teile nr', 'sachnummer', 'artikelnummer', 'materialnummer', 'teil'],
  ...['numero de piece', 'reference piece', 'reference', 'piece'],
  ...['numero de pieza', 'referencia', 'pieza', 'codice pezzo', 'numero pezzo', 'codice articolo'],
]

/** Fields of parts with their characteristics: one row for each characteristic. */
export const partFields = (side: Side): Field[] => [
  { key: 'partner', type: 'text', ...partner[side] },
  {
    ...{ key: 'number', label: 'Part number', type: 'text', required: true, example: '7741-220' },
    hint: 'The customer’s part number.',
    names: numberNames,
  },
  {
    ...{ key: 'name', label: 'Part name', type: 'text', example: 'Bearing housing' },
    hint: 'In the first row of a part; rows below may leave it empty.',
    names: [
      ...['part name', 'part description', 'description', 'designation', 'benennung', 'bezeichnung'],
      ...[
        'teilebezeichnung',
        'nom de la piece',
        'nombre de la pieza',
        'nome pezzo',
        'descrizione',
        'descripcion',
      ],
    ],
  },
  {
    ...{ key: 'supplierNumber', label: 'Supplier’s own number', type: 'text', example: 'HT-220' },
    hint: 'The number under which the supplier keeps the part; empty where it has none.',
    names: [
      ...[
        'supplier s own number',
        'own number',
        'our number',
        'internal number',
        'alias',
        'supplier part number',
      ],
      ...['eigene nummer', 'interne nummer', 'numero interne', 'numero interno'],
    ],
  },
  {
    ...{ key: 'revision', label: 'Revision', type: 'text', example: 'A' },
    hint: 'Empty: the current one. A revision that the part does not have yet is added and becomes the current one, with the characteristics of this file alone.',
    names: [
      'revision',
      'rev',
      'index',
      'drawing revision',
      'anderungsstand',
      'aenderungsstand',
      'anderungsindex',
      'indice',
      'revisione',
    ],
  },
  {
    ...{ key: 'characteristic', label: 'Characteristic number', type: 'whole', example: '5' },
    hint: 'The number on the drawing. A row without it enters the part alone.',
    names: [
      ...[
        'characteristic number',
        'characteristic no',
        'char no',
        'feature number',
        'feature no',
        'balloon',
        'no',
      ],
      ...['merkmalnummer', 'merkmalsnummer', 'merkmal nr', 'pos', 'position'],
      ...['numero de caracteristique', 'numero de caracteristica', 'numero caratteristica'],
    ],
  },
  {
    ...{ key: 'characteristicName', label: 'Characteristic name', type: 'text', example: 'bore diameter' },
    hint: 'What is measured.',
    names: [
      ...['characteristic name', 'characteristic', 'feature', 'feature name', 'dimension'],
      ...['merkmal', 'merkmalsbezeichnung', 'mass', 'caracteristique', 'caracteristica', 'caratteristica'],
    ],
  },
  {
    ...{ key: 'nominal', label: 'Nominal', type: 'decimal', example: '24.000' },
    hint: 'With every digit of the drawing.',
    names: [
      'nominal',
      'nominal value',
      'target',
      'nennmass',
      'sollwert',
      'soll',
      'nennwert',
      'valeur nominale',
      'valor nominal',
      'nominale',
      'valore nominale',
    ],
  },
  {
    ...{ key: 'lowerLimit', label: 'Lower limit', type: 'decimal', example: '23.975' },
    hint: 'Empty for a tolerance with an upper limit alone.',
    names: [
      'lower limit',
      'lsl',
      'lower specification limit',
      'min',
      'minimum',
      'usg',
      'ug',
      'untere grenze',
      'untere toleranzgrenze',
      'mindestmass',
      'limite inferieure',
      'limite inferior',
      'limite inferiore',
    ],
  },
  {
    ...{ key: 'upperLimit', label: 'Upper limit', type: 'decimal', example: '24.025' },
    hint: 'Empty for a tolerance with a lower limit alone.',
    names: [
      'upper limit',
      'usl',
      'upper specification limit',
      'max',
      'maximum',
      'osg',
      'og',
      'obere grenze',
      'obere toleranzgrenze',
      'hochstmass',
      'limite superieure',
      'limite superior',
      'limite superiore',
    ],
  },
  {
    ...{ key: 'tolerance', label: 'Tolerance ±', type: 'decimal', example: '' },
    hint: 'In place of both limits: 0.025 for the nominal ± 0.025.',
    names: [
      'tolerance ±',
      'tolerance',
      '±',
      'tolerance plus minus',
      'toleranz',
      'tol',
      'toleranz ±',
      'tolerancia',
      'tolleranza',
    ],
  },
  {
    ...{ key: 'unit', label: 'Unit', type: 'text', example: 'mm' },
    hint: 'A unit of the list in the product, such as mm, µm, °, N·m or bar.',
    names: ['unit', 'units', 'uom', 'einheit', 'unite', 'unidad', 'unita'],
  },
  {
    ...{ key: 'class', label: 'Class', type: 'choice', example: 'significant' },
    hint: 'ordinary, significant or safety. Empty: ordinary, or as it is.',
    names: [
      'class',
      'classification',
      'importance',
      'klasse',
      'klassifizierung',
      'merkmalsklasse',
      'classe',
      'clase',
    ],
  },
  {
    ...{
      key: 'processStandardDeviation',
      label: 'Standard deviation of the process',
      type: 'decimal',
      example: '',
    },
    hint: 'Where both sides know one; otherwise empty.',
    names: [
      'standard deviation of the process',
      'process standard deviation',
      'process sigma',
      'sigma',
      'prozessstreuung',
      'prozessstandardabweichung',
      'ecart type du procede',
    ],
  },
]

export const classNames = {
  ordinary: ['normal', 'standard', 'minor', 'n', 'o', 'unkritisch', 'gewohnlich', 'ordinaire', 'ordinario'],
  significant: [
    'significant characteristic',
    'special',
    'sc',
    's',
    'major',
    'wichtig',
    'bedeutsam',
    'significatif',
    'significativo',
  ],
  safety: [
    'safety relevant',
    'critical',
    'cc',
    'c',
    'sicherheit',
    'sicherheitsrelevant',
    'kritisch',
    'securite',
    'seguridad',
    'sicurezza',
  ],
} as const
