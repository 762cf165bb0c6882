/** Longest side after shrinking, and the share of quality that keeps a photo near 0.8 MB. */
const longestPx = 2048;
const quality = 0.82;
const leastPx = 600;
/** Mean brightness, 0 to 255, below which a label can seldom be read. Our own figure, tried on drawn pictures. */
const darkBelow = 42;

export type Prepared = { ok: true; file: Blob; name: string; warning: string | null } | { ok: false; message: string };

const accepted = ["image/jpeg", "image/png", "image/webp"];

/** Why a file cannot be taken at all; null when it can be tried. */
export function refusalOf({ type, size, name }: Pick<File, "type" | "size" | "name">): string | null {
  if (size === 0) return "The file is empty. Take the photo again.";
  if (/hei[cf]/i.test(type) || /\.hei[cf]$/i.test(name))
    return "This is a HEIC picture, which cannot be read here. Set the camera to JPEG, or take it from this page.";
  if (!accepted.includes(type)) return "This is not a photo. Choose a JPEG, PNG or WebP picture.";
  return null;
}

/** What a file turns out to be by its first bytes, whatever its name says; null for what may be a picture. */
async function refusalByBytes(file: Blob): Promise<string | null> {
  const start = new TextDecoder("latin1").decode(await file.slice(0, 16).arrayBuffer());
  if (start.startsWith("%PDF")) return "This is a PDF, not a photo, whatever its name says. Take the photo again.";
  if (/^....ftyp(hei|hev|mif)/s.test(start))
    return "This is a HEIC picture, which cannot be read here. Set the camera to JPEG, or take it from this page.";
  return null;
}

/** Shrinks a photo in the browser and looks whether it can be read. Never throws. */
export async function preparePhoto(file: File): Promise<Prepared> {
  const refusal = refusalOf(file);
  if (refusal) return { ok: false, message: refusal };
  try {
    const unfit = await refusalByBytes(file);
    if (unfit) return { ok: false, message: unfit };
    const picture = await createImageBitmap(file, { imageOrientation: "from-image" });
    const scale = Math.min(1, longestPx / Math.max(picture.width, picture.height));
    const canvas = document.createElement("canvas");
    canvas.width = Math.round(picture.width * scale);
    canvas.height = Math.round(picture.height * scale);
    canvas.getContext("2d")?.drawImage(picture, 0, 0, canvas.width, canvas.height);
    const isSmall = Math.max(picture.width, picture.height) < leastPx;
    picture.close();
    const shrunk = await new Promise<Blob | null>((done) => canvas.toBlob(done, "image/jpeg", quality));
    if (!shrunk) return { ok: false, message: "The photo could not be made smaller. Take it again." };
    const warning = isDark(canvas) ? tooDark : isSmall ? "Too small to read. Go closer, take again." : null;
    return { ok: true, file: shrunk, name: `${file.name.replace(/\.[^.]*$/, "") || "photo"}.jpg`, warning };
  } catch (error) {
    console.warn("The photo could not be read.", error);
    return { ok: false, message: "The photo could not be read. Take it again." };
  }
}

export const tooDark = "Too dark to read. Use the torch, take again.";

/** Whether a picture is too dark, judged on a small copy of it. */
export function isDark(picture: CanvasImageSource): boolean {
  const side = 32;
  const small = document.createElement("canvas");
  small.width = side;
  small.height = side;
  const drawing = small.getContext("2d", { willReadFrequently: true });
  if (!drawing) return false;
  drawing.drawImage(picture, 0, 0, side, side);
  const { data } = drawing.getImageData(0, 0, side, side);
  let sum = 0;
  for (let at = 0; at < data.length; at += 4)
    sum += 0.2126 * (data[at] ?? 0) + 0.7152 * (data[at + 1] ?? 0) + 0.0722 * (data[at + 2] ?? 0);
  return sum / (side * side) < darkBelow;
}
