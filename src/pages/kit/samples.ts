// Invented things to draw in the kit: a code, joints, an order, money, stand-in photos.
import type { Joint } from '../../ui/joint-strip';
import type { LegStep, RaceShop, RaceSum } from '../../ui/two-leg-race';

export const NOW = '2026-03-16T15:00:00Z';
export const ZONE = 'America/Boise';

export const CODE = ['K66A', '4X', 'D9', '09147', '03'];

export const DECODED = [
  { value: 'K66A', label: 'Family', meaning: 'Keld 66A', detail: 'six-speed automatic' },
  { value: '4X', label: 'Output', meaning: '4x4', detail: '31-spline' },
  { value: 'D9', label: 'Bell', meaning: 'D9 pattern', detail: 'nine bolts' },
  { value: '09147', label: 'Built', meaning: '27 May 2009', detail: 'year 09, day 147' },
  { value: '03', label: 'Change', meaning: 'Level 03', detail: 'late pump' },
];

export const JOINTS: readonly Joint[] = [
  { name: 'Converter', state: 'fits' },
  { name: 'Bellhousing', state: 'fits' },
  { name: 'Plug', state: 'with_part' },
  { name: 'Shift', state: 'fits' },
  { name: 'Mount', state: 'not_known' },
  { name: 'Output', state: 'fits' },
  { name: 'Rear face', state: 'fits' },
  { name: 'Length', state: 'no_fit' },
];

export const OUT: readonly LegStep[] = [
  { key: 'pay', label: 'Paid', when: 'Mon 16 Feb', money: '$2,359.03 in', state: 'proved' },
  { key: 'pack', label: 'Packed', when: 'Tue 17 Feb', state: 'proved' },
  { key: 'send', label: 'Picked up', when: 'Wed 18 Feb', state: 'proved' },
  { key: 'deliver', label: 'Delivered', when: 'Mon 23 Feb', state: 'proved' },
  { key: 'accept', label: 'Checked', when: 'Tue 24 Feb', money: '$1,450.00 to yard', state: 'proved' },
];

export const BACK: readonly LegStep[] = [
  { key: 'book', label: 'Tag and book', when: 'Now', state: 'now' },
  { key: 'come', label: 'Picked up', when: 'by Wed 25 Mar', state: 'todo' },
  { key: 'dock', label: 'Received', when: '2 to 4 days', state: 'todo' },
  { key: 'grade', label: 'Graded', when: 'within 5 days', money: '$600.00 to you', state: 'todo' },
];

export const SHOP: RaceShop = { place: 'Your shop', label: 'Swapped', when: 'Sat 14 Mar', state: 'proved' };

export const SUMS: readonly RaceSum[] = [
  { label: 'Unit price', cents: 145_000, where: 'Released to yard', state: 'moved' },
  { label: 'Deposit', cents: 60_000, where: 'Held for you', state: 'held' },
  { label: 'Freight and tax', cents: 30_903, where: 'Paid out', state: 'moved' },
];

const picture = (ground: string, x: number) =>
  `data:image/svg+xml,${encodeURIComponent(
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 400 300"><rect width="400" height="300" fill="${ground}"/><path d="M${x} 90l90-30h120v180h-120l-90-30z" fill="#8d9491" stroke="#12181a" stroke-width="3"/><circle cx="${x + 60}" cy="150" r="34" fill="#3d4647"/></svg>`,
  )}`;

export const PHOTO_SENT = picture('#5b5146', 70);
export const PHOTO_RECEIVED = picture('#46525b', 84);
