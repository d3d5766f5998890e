/** Lets the browser fetch a file of our own into its downloads. */
export function downloadFrom(address: string): void {
  const link = document.createElement('a');
  link.href = address;
  link.download = '';
  link.click();
}

/** Hands a file to the browser's downloads. */
export function download(name: string, mediaType: string, content: BlobPart): void {
  const url = URL.createObjectURL(new Blob([content], { type: mediaType }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  URL.revokeObjectURL(url);
}
