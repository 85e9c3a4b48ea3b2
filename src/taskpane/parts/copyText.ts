/**
 * Copies the text of a field. The clipboard's own interface is closed to pages inside Excel on some machines; the field
 * then stays selected, so that the keys for copying work.
 */
export async function copyFrom(field: HTMLTextAreaElement | null): Promise<boolean> {
  if (field === null) return false;
  field.focus();
  field.select();
  return navigator.clipboard.writeText(field.value).then(
    () => true,
    () => false,
  );
}
