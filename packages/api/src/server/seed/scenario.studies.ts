/** How far a study, and the submission that rests on it, have come. */
export type DemoEnd =
  | 'registered'
  | 'collecting'
  | 'abandoned'
  | 'computed'
  | 'draft'
  | 'for-signature'
  | 'submitted'
  | 'withdrawn'
  | 'challenged'
  | 'answered'
  | 'answered-by-criterion'
  | 'refused'
  | 'awaiting-second-person'
  | 'accepted'
  | 'accepted-after-challenge'
  | 'accepted-with-conditions'
  | 'answered-by-correction'
  | 'accepted-after-correction'
  | 'unresolved-proposed'
  | 'conditions-lapsed'
  | 'one-off-proposed'
  | 'one-off-accepted'

/** Registered so many days before the seeding, number of readings, and how far it came. */
export type DemoStudy = readonly [daysAgo: number, readings: number, end: DemoEnd]

/** Studies by part number, number on the drawing and gauge: the oldest first. */
export const studies: readonly (readonly [string, number, string, readonly DemoStudy[]])[] = [
  [
    '7741-220',
    1,
    'BG-14',
    [
      [285, 25, 'accepted'],
      [120, 12, 'abandoned'],
      [9, 25, 'submitted'],
    ],
  ],
  [
    '7741-220',
    1,
    'BG-11',
    [
      [280, 25, 'accepted'],
      [30, 25, 'computed'],
    ],
  ],
  [
    '7741-220',
    2,
    'AG-02',
    [
      [275, 30, 'accepted'],
      [14, 30, 'awaiting-second-person'],
    ],
  ],
  [
    '7741-220',
    3,
    'VC-22',
    [
      [260, 25, 'accepted'],
      [22, 25, 'challenged'],
    ],
  ],
  [
    '7741-220',
    4,
    'SP-4',
    [
      [130, 25, 'refused'],
      [16, 60, 'submitted'],
      [2, 25, 'registered'],
    ],
  ],
  [
    '7741-220',
    5,
    'MM-07',
    [
      [270, 25, 'accepted'],
      [35, 25, 'accepted-with-conditions'],
    ],
  ],
  [
    '7741-231',
    1,
    'BG-11',
    [
      [180, 25, 'withdrawn'],
      [100, 40, 'accepted-with-conditions'],
      [12, 25, 'submitted'],
    ],
  ],
  [
    '7741-231',
    2,
    'MM-07',
    [
      [175, 25, 'accepted'],
      [5, 25, 'for-signature'],
    ],
  ],
  [
    '7741-231',
    3,
    'SR-2',
    [
      [26, 25, 'answered-by-criterion'],
      [1, 20, 'registered'],
    ],
  ],
  [
    '7750-018',
    1,
    'AG-02',
    [
      [265, 30, 'accepted'],
      [90, 30, 'accepted'],
    ],
  ],
  [
    '7750-018',
    2,
    'CM-1',
    [
      [250, 25, 'accepted'],
      [7, 25, 'draft'],
    ],
  ],
  [
    '7750-018',
    3,
    'VC-22',
    [
      [240, 25, 'accepted-after-challenge'],
      [60, 25, 'accepted-after-correction'],
      [3, 25, 'collecting'],
    ],
  ],
  [
    '3310-402',
    1,
    'LT-2',
    [
      [230, 30, 'accepted'],
      [15, 30, 'submitted'],
    ],
  ],
  [
    '3310-402',
    2,
    'BG-7',
    [
      [225, 25, 'accepted'],
      [60, 8, 'refused'],
      [8, 25, 'submitted'],
    ],
  ],
  [
    '3310-402',
    3,
    'CM-3',
    [
      [220, 25, 'accepted'],
      [95, 25, 'conditions-lapsed'],
    ],
  ],
  [
    '3310-417',
    1,
    'VC-3',
    [
      [215, 25, 'accepted'],
      [6, 25, 'registered'],
    ],
  ],
  [
    '3310-417',
    2,
    'DG-9',
    [
      [210, 40, 'accepted-with-conditions'],
      [20, 40, 'challenged'],
    ],
  ],
  [
    '9022-005',
    1,
    'FT-1',
    [
      [205, 25, 'accepted'],
      [110, 25, 'accepted'],
      [13, 25, 'awaiting-second-person'],
    ],
  ],
  [
    '9022-005',
    2,
    'HG-6',
    [
      [200, 25, 'accepted'],
      [105, 25, 'accepted'],
    ],
  ],
  [
    '9022-005',
    3,
    'MM-2',
    [
      [195, 25, 'accepted'],
      [24, 10, 'answered-by-correction'],
    ],
  ],
  [
    '9022-011',
    1,
    'FT-4',
    [
      [190, 25, 'accepted'],
      [75, 30, 'accepted'],
      [4, 25, 'computed'],
    ],
  ],
  [
    'NV-55-310',
    1,
    'AG-02',
    [
      [255, 12, 'refused'],
      [27, 12, 'submitted'],
    ],
  ],
  [
    'NV-55-310',
    2,
    'CM-1',
    [
      [245, 10, 'answered'],
      [40, 10, 'computed'],
      [29, 10, 'unresolved-proposed'],
    ],
  ],
  [
    'NV-55-310',
    3,
    'VC-22',
    [
      [235, 10, 'accepted'],
      [28, 10, 'challenged'],
    ],
  ],
  [
    'NV-55-322',
    1,
    'BG-14',
    [
      [228, 10, 'computed'],
      [150, 10, 'accepted-with-conditions'],
    ],
  ],
  [
    'NV-55-322',
    2,
    'BA-3',
    [
      [222, 10, 'accepted'],
      [18, 10, 'for-signature'],
    ],
  ],
  [
    'OC 12-118',
    1,
    'MM-07',
    [
      [65, 25, 'computed'],
      [45, 25, 'one-off-accepted'],
    ],
  ],
  ['OC 12-118', 2, 'VC-22', [[21, 25, 'one-off-proposed']]],
  ['OC 12-140', 1, 'VC-22', [[11, 25, 'submitted']]],
  ['OC 12-140', 2, 'TW-5', [[10, 25, 'registered']]],
]

export const abandonReason = 'The master was exchanged halfway through; the readings are of two objects.'

/** Zero-based places of the readings that are challenged. */
export const challengedReadings = [2, 10]
export const challengeText =
  'The run sheet notes a break before readings 3 and 11. Were they taken on the same setting of the fixture?'
export const answerText =
  'The readings stand as taken. The fixture was not touched; the operator reports coolant on the contact at both.'
export const criterionText =
  'The readings stand. What does not suit a roughness is the margin: we propose another one, with this challenge as its case.'
export const criterionComment =
  'This tolerance has one limit only, so a share of it says little. Two tenths of a micrometre can be shown.'
export const correctionText =
  'You are right: both were taken after the fixture was set anew. They were taken again on the first setting.'
export const unresolvedText =
  'Neither of us can show it from here. We propose to leave it open and have the ring measured elsewhere.'
export const laboratory = 'Hallvik measuring laboratory (invented)'
export const refusalReason =
  'The criteria are not met. Please repair or replace the gauge and study it again.'
export const withdrawalReason = 'The wrong master was used; a new study follows.'
export const conditionTexts = {
  study: 'Repeat the study after the next calibration, with the same number of readings.',
  instruction: 'Send the work instruction with the new way of clamping.',
}
export const conditionReport = 'The instruction was changed and both shifts were told; it is attached.'
