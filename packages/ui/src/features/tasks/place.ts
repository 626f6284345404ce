/** Where a measuring task is done: process step and site; a step that begins with the site says both. */
export const placeText = ({
  site,
  processStep,
}: {
  site: string | null
  processStep: string | null
}): string =>
  site && processStep?.toLowerCase().startsWith(site.toLowerCase())
    ? processStep
    : [processStep, site].filter(Boolean).join(', ')
