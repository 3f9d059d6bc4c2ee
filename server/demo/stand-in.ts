// Drawn stand-ins for photos: the code pad of one unit with its own code, and plain views that no rendered picture shows.
import sharp from 'sharp';
import type { UnitKind } from '../../shared/catalogue/kinds';
import { dotsOf } from './dot-font';

const WIDTH = 960;
const HEIGHT = 720;

function plate(text: string, y: number, height: number): string {
  const columns = text.length * 6;
  const pitch = Math.min((WIDTH - 160) / columns, height / 9);
  const left = (WIDTH - columns * pitch) / 2;
  return dotsOf(text)
    .map(({ column, row }) => {
      const x = left + column * pitch + pitch / 2;
      const dotY = y + row * pitch;
      return `<circle cx="${(x + 1.5).toFixed(1)}" cy="${(dotY + 1.5).toFixed(1)}" r="${(pitch * 0.46).toFixed(1)}" fill="#e9ece9"/><circle cx="${x.toFixed(1)}" cy="${dotY.toFixed(1)}" r="${(pitch * 0.42).toFixed(1)}" fill="#23292a"/>`;
    })
    .join('');
}

const metal = (from: string, to: string): string =>
  `<defs><linearGradient id="m" x1="0" y1="0" x2="1" y2="1"><stop offset="0" stop-color="${from}"/><stop offset="1" stop-color="${to}"/></linearGradient></defs><rect width="${WIDTH}" height="${HEIGHT}" fill="url(#m)"/>`;

const jpeg = (svg: string): Promise<Buffer> => sharp(Buffer.from(svg)).jpeg({ quality: 82 }).toBuffer();
const svg = (inside: string): string =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="${WIDTH}" height="${HEIGHT}" viewBox="0 0 ${WIDTH} ${HEIGHT}">${inside}</svg>`;

/** The pad with this unit's code, dot by dot; long codes stand in two lines. */
export function drawCodePad(code: string): Promise<Buffer> {
  const groups = code.split(' ');
  const half = Math.ceil(groups.length / 2);
  const lines = code.length > 13 ? [groups.slice(0, half).join(' '), groups.slice(half).join(' ')] : [code];
  const rows = lines
    .map((line, index) => plate(line, lines.length === 1 ? 300 : 230 + index * 170, 150))
    .join('');
  return jpeg(
    svg(
      `${metal('#8a9091', '#6a7071')}<rect x="48" y="150" width="864" height="420" rx="18" fill="#b9bfbd" stroke="#5b6162" stroke-width="6"/><rect x="62" y="164" width="836" height="392" rx="12" fill="#c6cbc9"/>${rows}`,
    ),
  );
}

const OUTLINES: Readonly<Record<UnitKind, string>> = {
  automatic:
    '<path d="M180 200 340 240v240l-160 60zM340 250h330v230H340zM670 290l150 40v110l-150 40z"/><path d="M360 480h290l-24 70H390z"/>',
  manual:
    '<path d="M180 190 330 250v230l-150 70zM330 260h340v210H330zM670 290l160 40v90l-160 40z"/><path d="M470 260l14-120h24l14 120z"/>',
  transfer_case:
    '<path d="M320 200h220v250l-60 90H370l-50-90z"/><path d="M540 230h180v90H540zM180 400h140v80H180z"/><circle cx="430" cy="270" r="46"/>',
  axle: '<path d="M80 330h280v70H80zM600 330h280v70H600z"/><circle cx="480" cy="365" r="130"/><circle cx="480" cy="365" r="96"/>',
};

/** A plain view of a kind of unit; the shot's number is all that tells one from another. */
export function drawView(kind: UnitKind, shotNumber: number): Promise<Buffer> {
  const turn = (shotNumber * 7) % 20;
  return jpeg(
    svg(
      `${metal('#d9dcd9', '#b7bcb9')}<g fill="#99a09e" stroke="#23292a" stroke-width="7" stroke-linejoin="round" transform="rotate(${turn - 10} 480 360)">${OUTLINES[kind]}</g>${plate(String(shotNumber), 40, 70)}`,
    ),
  );
}
