const pattern = /^[A-Za-z0-9][A-Za-z0-9._-]*(?:\/[A-Za-z0-9][A-Za-z0-9._-]*)*$/;

/** The key, when it can be used as it stands as a path and as an S3 key; throws otherwise. No part may begin with a dot. */
export function storageKey(text: string): string {
  if (text.length > 200 || !pattern.test(text)) throw new Error("not a storage key of ours");
  return text;
}
