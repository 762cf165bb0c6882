import sharp from "sharp";

/** Plain drawings that stand in for site photos. No real place, make or person is shown. */
const frame = (wall: string, shapes: string) =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="640" height="480" viewBox="0 0 640 480"><rect width="640" height="480" fill="${wall}"/>${shapes}</svg>`;

const box = (x: number, y: number, w: number, h: number, fill: string, edge = "#2b2f2c") =>
  `<rect x="${x}" y="${y}" width="${w}" height="${h}" rx="8" fill="${fill}" stroke="${edge}" stroke-width="3"/>`;

const cable = (path: string, width: number, colour = "#262a28") =>
  `<path d="${path}" fill="none" stroke="${colour}" stroke-width="${width}" stroke-linecap="round"/>`;

const drawings = {
  "service-head": frame(
    "#cfc6b4",
    `${cable("M320 480V330", 34)}${box(240, 190, 160, 150, "#3a3f3c")}${box(272, 120, 96, 84, "#4a504c")}${cable("M292 120V40", 14, "#8d8d8d")}${cable("M348 120V40", 14, "#1f4f8b")}<circle cx="320" cy="162" r="9" fill="#a8501f"/>`,
  ),
  meter: frame(
    "#d6d0c2",
    `${box(210, 90, 220, 260, "#e9e6dd")}${box(240, 125, 160, 60, "#b9c7b4")}<rect x="258" y="145" width="96" height="8" fill="#38423a"/><rect x="258" y="160" width="60" height="8" fill="#38423a"/>${cable("M260 350V440", 12)}${cable("M300 350V440", 12)}${cable("M340 350V440", 12)}${cable("M380 350V440", 12)}`,
  ),
  "earth-terminal": frame(
    "#c9c2b3",
    `${box(180, 200, 280, 70, "#b08b3c")}${[220, 280, 340, 400].map((x) => `<circle cx="${x}" cy="235" r="13" fill="#7d6226"/>${cable(`M${x} 235V420`, 12, "#4f8f3d")}`).join("")}`,
  ),
  "consumer-unit": frame(
    "#ddd8cc",
    `${box(120, 110, 400, 220, "#f3f1ea")}${[150, 200, 250, 300, 350, 400].map((x, index) => `${box(x, 170, 42, 100, index === 0 ? "#b23b2e" : "#2f3532")}<rect x="${x + 14}" y="200" width="14" height="30" fill="#e8e4d8"/>`).join("")}`,
  ),
  chargepoint: frame(
    "#b7a48b",
    `${[60, 120, 180, 240, 300, 360, 420].map((y) => `<path d="M0 ${y}H640" stroke="#a08c72" stroke-width="3"/>`).join("")}${box(240, 110, 160, 220, "#2f3634")}<circle cx="320" cy="190" r="34" fill="#1c211f" stroke="#23695b" stroke-width="6"/>${cable("M320 330Q320 430 400 430T470 330", 16)}`,
  ),
  "rating-plate": frame(
    "#3a403d",
    `${box(110, 110, 420, 260, "#d9dcd8")}${[150, 190, 230, 270, 310].map((y, index) => `<rect x="145" y="${y}" width="${300 - index * 34}" height="14" fill="#3a403d"/>`).join("")}<rect x="430" y="290" width="64" height="50" fill="#3a403d"/>`,
  ),
  isolator: frame(
    "#d2cbbd",
    `${box(230, 130, 180, 200, "#e9e6dd")}<circle cx="320" cy="225" r="52" fill="#b23b2e"/><rect x="310" y="176" width="20" height="98" fill="#7c241a"/>`,
  ),
} as const;

export type DrawnSubject = keyof typeof drawings;
export const isDrawn = (subject: string): subject is DrawnSubject => subject in drawings;

export const drawPhoto = async (subject: DrawnSubject): Promise<Uint8Array> =>
  new Uint8Array(await sharp(Buffer.from(drawings[subject])).jpeg({ quality: 80 }).toBuffer());
