/** The id of the control that edits `path`, so that an error can point at it. */
export function fieldId(path: string): string {
  return `field-${path.replace(/[^A-Za-z0-9]+/g, '-').replace(/-$/, '')}`;
}
