import type { OrganisationKey } from './scenario.organisations'

type CharacteristicClass = 'ordinary' | 'significant' | 'safety'

/** Drawing number, name, nominal, lower and upper limit (empty for none), unit, class. */
export type DemoCharacteristic = readonly [
  number,
  string,
  string,
  string,
  string,
  string,
  CharacteristicClass,
]

export interface DemoPart {
  supplier: OrganisationKey
  customer: OrganisationKey
  number: string
  supplierNumber: string
  name: string
  revision: string
  characteristics: readonly DemoCharacteristic[]
}

/** A dozen part numbers with thirty characteristics; all invented. */
export const parts: DemoPart[] = [
  {
    supplier: 'tarnfield',
    customer: 'brackwell',
    number: '7741-220',
    supplierNumber: 'TT-1180',
    name: 'Output shaft',
    revision: 'C',
    characteristics: [
      [1, 'Bore Ø', '24.000', '23.975', '24.025', 'mm', 'significant'],
      [2, 'Bearing seat Ø', '35.000', '34.989', '35.011', 'mm', 'safety'],
      [3, 'Overall length', '182.50', '182.35', '182.65', 'mm', 'ordinary'],
      [4, 'Spline over pins', '28.640', '28.600', '28.680', 'mm', 'significant'],
      [5, 'Shoulder width', '12.00', '11.95', '12.05', 'mm', 'ordinary'],
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'brackwell',
    number: '7741-231',
    supplierNumber: 'TT-1194',
    name: 'Spacer ring',
    revision: 'A',
    characteristics: [
      [1, 'Bore Ø', '31.500', '31.480', '31.520', 'mm', 'significant'],
      [2, 'Width', '8.000', '7.990', '8.010', 'mm', 'ordinary'],
      [3, 'Roughness Ra', '', '', '1.6', 'µm', 'ordinary'],
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'brackwell',
    number: '7750-018',
    supplierNumber: 'TT-1230',
    name: 'Bearing carrier',
    revision: 'B',
    characteristics: [
      [1, 'Bearing bore Ø', '52.000', '51.985', '52.015', 'mm', 'safety'],
      [2, 'Bolt circle Ø', '88.00', '87.90', '88.10', 'mm', 'ordinary'],
      [3, 'Flange thickness', '14.20', '14.10', '14.30', 'mm', 'ordinary'],
    ],
  },
  {
    supplier: 'osmere',
    customer: 'brackwell',
    number: '3310-402',
    supplierNumber: 'OC 77-2',
    name: 'Housing, rear',
    revision: 'D',
    characteristics: [
      [1, 'Leak rate', '', '', '2.0', 'ml/min', 'safety'],
      [2, 'Bearing bore Ø', '72.000', '71.985', '72.015', 'mm', 'significant'],
      [3, 'Dowel distance', '164.00', '163.96', '164.04', 'mm', 'ordinary'],
    ],
  },
  {
    supplier: 'osmere',
    customer: 'brackwell',
    number: '3310-417',
    supplierNumber: 'OC 77-9',
    name: 'Cover',
    revision: 'A',
    characteristics: [
      [1, 'Face thickness', '6.50', '6.35', '6.65', 'mm', 'ordinary'],
      [2, 'Seal groove depth', '2.40', '2.35', '2.45', 'mm', 'significant'],
    ],
  },
  {
    supplier: 'velloy',
    customer: 'brackwell',
    number: '9022-005',
    supplierNumber: 'V 5-118',
    name: 'Return spring',
    revision: 'B',
    characteristics: [
      [1, 'Force at 42 mm', '118', '112', '124', 'N', 'safety'],
      [2, 'Free length', '61.5', '60.9', '62.1', 'mm', 'ordinary'],
      [3, 'Wire diameter', '2.80', '2.77', '2.83', 'mm', 'ordinary'],
    ],
  },
  {
    supplier: 'velloy',
    customer: 'brackwell',
    number: '9022-011',
    supplierNumber: 'V 5-131',
    name: 'Detent spring',
    revision: 'A',
    characteristics: [[1, 'Force at 18 mm', '34.0', '32.5', '35.5', 'N', 'significant']],
  },
  {
    supplier: 'tarnfield',
    customer: 'norvane',
    number: 'NV-55-310',
    supplierNumber: 'TT-2007',
    name: 'Rotor shaft',
    revision: '02',
    characteristics: [
      [1, 'Seat Ø', '30.000', '29.993', '30.007', 'mm', 'safety'],
      [2, 'Seat Ø', '25.000', '24.993', '25.007', 'mm', 'significant'],
      [3, 'Thread length', '22.0', '21.8', '22.2', 'mm', 'ordinary'],
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'norvane',
    number: 'NV-55-322',
    supplierNumber: 'TT-2011',
    name: 'Balance disc',
    revision: '01',
    characteristics: [
      [1, 'Bore Ø', '30.020', '30.010', '30.030', 'mm', 'significant'],
      [2, 'Mass', '412.0', '410.0', '414.0', 'g', 'ordinary'],
    ],
  },
  {
    supplier: 'velloy',
    customer: 'norvane',
    number: 'NV-81-004',
    supplierNumber: 'V 7-020',
    name: 'Brush spring',
    revision: '03',
    characteristics: [[1, 'Force at 9 mm', '6.20', '5.90', '6.50', 'N', 'significant']],
  },
  {
    supplier: 'tarnfield',
    customer: 'osmere',
    number: 'OC 12-118',
    supplierNumber: 'TT-1311',
    name: 'Dowel sleeve',
    revision: 'A',
    characteristics: [
      [1, 'Outside Ø', '10.000', '9.994', '10.006', 'mm', 'significant'],
      [2, 'Length', '16.00', '15.90', '16.10', 'mm', 'ordinary'],
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'osmere',
    number: 'OC 12-140',
    supplierNumber: 'TT-1322',
    name: 'Plug',
    revision: 'B',
    characteristics: [
      [1, 'Head Ø', '18.00', '17.95', '18.05', 'mm', 'ordinary'],
      [2, 'Tightening torque', '24.0', '22.0', '26.0', 'N·m', 'safety'],
    ],
  },
]

/** Entered by the supplier a few days ago and waiting for the customer's confirmation. */
export const lately: readonly { number: string; daysAgo: number; characteristic: DemoCharacteristic }[] = [
  {
    number: '7741-220',
    daysAgo: 6,
    characteristic: [6, 'Chamfer 2 × 45°', '2.0', '1.8', '2.2', 'mm', 'ordinary'],
  },
  {
    number: 'NV-55-310',
    daysAgo: 3,
    characteristic: [4, 'Runout of seat', '', '', '0.02', 'mm', 'significant'],
  },
]
