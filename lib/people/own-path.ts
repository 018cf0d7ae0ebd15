/** A path of this site out of an address that came with a link, or null: nobody is sent to another site after signing in. */
export function ownPath(text: string | string[] | undefined): string | null {
  if (typeof text !== "string" || text.length > 500 || !/^\/(?![/\\])[\w\-./~%?=&]*$/.test(text)) return null;
  return text;
}
