/** Offers a text of a type, or bytes, as a file to be saved. */
export function keepFile(name: string, content: string | Blob, type?: string): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(typeof content === 'string' ? new Blob([content], type === undefined ? {} : { type }) : content);
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(link.href), 10_000);
}
