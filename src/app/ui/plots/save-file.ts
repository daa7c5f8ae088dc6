/** Hands a file to the person: the browser saves it under its name. */
export function saveFile(document: Document, name: string, content: Blob): void {
  const address = URL.createObjectURL(content);
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  // The browser has taken the content once the click is over; a little later even a slow one has.
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}
