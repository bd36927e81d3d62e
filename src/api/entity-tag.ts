/** The entity tag of a version, as the server writes it; for contracts that carry their version in the body. */
export function entityTag(version: number): string {
  return `"${version}"`;
}
