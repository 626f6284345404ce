/** The path, below the organisation, of the page that shows everything one clause of an agreement does. */
export function clausePagePath(
  agreementId: string,
  at: { clause: string; version?: string; characteristic?: string },
): string {
  const query = new URLSearchParams()
  query.set('clause', at.clause)
  if (at.version) query.set('version', at.version)
  if (at.characteristic) query.set('characteristic', at.characteristic)
  return `agreements/${agreementId}/consequences?${query.toString()}`
}
