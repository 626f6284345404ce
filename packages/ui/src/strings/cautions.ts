/** Cautions that the product carries wherever a verdict may be taken for more than it is. */
export const cautionWords = {
  heading: 'What this does not replace',
  support:
    'Results support, and never replace, customer-specific requirements, applicable standards and law, accredited calibration, and the judgement of qualified people.',
  safetyHeading: 'Safety class',
  safety:
    'People may depend on this characteristic. A verdict here does not release it: weigh it with qualified people, and accept it with a second person only.',
  /** Beside a clause that a point estimate or a zero-difference test decides. */
  weakOnSafety:
    'Safety class: this clause is met by an estimate or by failing to find a difference. It proves little by itself.',
} as const
