/**
 * What a seat looked like at an inspection. ISO 15243:2017 names the modes of damage to rolling
 * bearings and, for fretting and creep, to their seats; "sound" and "creep marks" are the trade's.
 */
export const seatMarks = [
  'sound',
  'fretting corrosion',
  'creep marks',
  'adhesive wear',
  'abrasive wear',
  'moisture corrosion',
  'plastic deformation',
  'cracked',
] as const;
export type SeatMark = (typeof seatMarks)[number];

/** What each word means on a seat, with the clause of ISO 15243:2017 (clauses from memory). */
export const conditionWords: Readonly<
  Record<SeatMark, { clause: string | null; meaning: string }>
> = {
  sound: { clause: null, meaning: 'Ground or turned surface as made, no marks of movement.' },
  'fretting corrosion': {
    clause: '5.3.3.2',
    meaning: 'Reddish-brown or black oxide in patches: the ring moves on the seat by micrometres.',
  },
  'creep marks': {
    clause: null,
    meaning: 'Polished or scored bands round the seat: the ring has turned on it.',
  },
  'adhesive wear': {
    clause: '5.2.3',
    meaning: 'Smeared or torn metal: the ring has slid on the seat under load.',
  },
  'abrasive wear': {
    clause: '5.2.2',
    meaning: 'Dull, lapped surface and loss of size from hard particles between ring and seat.',
  },
  'moisture corrosion': {
    clause: '5.3.2',
    meaning: 'Rust pits from water or condensate; the size is lost where it is cleaned off.',
  },
  'plastic deformation': {
    clause: '5.5',
    meaning: 'Dents, raised edges or a hammered bore; the contact is no longer all round.',
  },
  cracked: { clause: '5.6', meaning: 'A crack in ring, shaft or housing: out of service.' },
};
