import type { Role } from '#shared/vocabulary/statuses.ts';

/**
 * The people of the demo: an invented loose club, the Low Water potters, round the invented
 * estuary town of Marrowhithe. None of them is anybody.
 */
export interface DemoPerson {
  readonly key: string;
  readonly name: string;
  /** The reserved top-level domain never reaches a mailbox. */
  readonly email: string;
  readonly role: Role;
  readonly place: string;
  readonly about: string;
  readonly temperatureUnit: 'C' | 'F';
  readonly measureUnits: 'metric' | 'imperial';
}

const person = (
  key: string,
  name: string,
  role: Role,
  place: string,
  about: string,
  units: Pick<DemoPerson, 'temperatureUnit' | 'measureUnits'> = {
    temperatureUnit: 'C',
    measureUnits: 'metric',
  },
): DemoPerson => ({ key, name, email: `${key}@marrowhithe.example`, role, place, about, ...units });

export const people: readonly DemoPerson[] = [
  person(
    'imke',
    'Imke Dunnow',
    'admin',
    'Marrowhithe, Customs Steps',
    'Surveyed harbours for thirty years and now measures kilns. Keeps the club’s papers, and a dustbin that reaches a thousand degrees when it feels like it.',
  ),
  person(
    'tunde',
    'Tunde Arrowby',
    'moderator',
    'Ropers’ Yard, Marrowhithe',
    'Fitted gas for a living until my knees objected. I look after the club’s top hat in Ropers’ Yard and I will ask about your hose.',
  ),
  person(
    'mina',
    'Mina Castellow',
    'moderator',
    'Marrowhithe',
    'Teaches art to eleven-year-olds, who notice everything. Fires the school-yard kiln with them watching from behind the blue line.',
  ),
  person(
    'rafiq',
    'Rafiq Hollowsen',
    'member',
    'Gannow Flats',
    'Boatbuilder on Gannow Flats. Fires an oil drum beside the slip, usually in more wind than is sensible.',
  ),
  person(
    'josune',
    'Josune Pellarin',
    'member',
    'Upper Staithe Lane',
    'Makes tall thin bottles and copper matt that sometimes stays. Backyard kiln with a chimney cap like a lantern.',
  ),
  person(
    'agnes',
    'Agnes Thorlby',
    'member',
    'Thorle',
    'Eighty-one. Began with raku at seventy-six because the hens had finished with the henhouse.',
  ),
  person(
    'kwabena',
    'Kwabena Lisle',
    'member',
    'Marrowhithe, by the infirmary',
    'Night nurse, daytime potter. Builds domed kilns out of chicken wire and patience.',
  ),
  person(
    'saoirse',
    'Saoirse Quillow',
    'member',
    'Lock Cottage, Thorle',
    'Learned from American books, so I think in Fahrenheit. Everything I own is small, the kiln included.',
    { temperatureUnit: 'F', measureUnits: 'imperial' },
  ),
  person(
    'daviti',
    'Daviti Morrowani',
    'member',
    'Old Ferry slip',
    'Ferryman, retired with the ferry. The kiln stands on the old slip where the wind has a long run at it.',
  ),
  person(
    'haruka',
    'Haruka Bellwether',
    'member',
    'Cold Staithe',
    'Tea bowls, mostly failed on purpose. Cold Staithe, by the sluice. Keeps three notebooks and loses two.',
  ),
  person(
    'leocadia',
    'Leocadia Finchley-Oduya',
    'member',
    'Thorle orchard',
    'Orchard, two kilns, one of them with a plug. Tiles for kitchens that do not exist yet.',
  ),
  person(
    'emrys',
    'Emrys Vantongel',
    'member',
    'Pellow Hill',
    'Forester. Fires driftwood because it is free and propane because it is quick, and complains about both.',
  ),
  person(
    'noor',
    'Noor Trevannick',
    'member',
    'Marrowhithe',
    'Started in spring 2025 with a steel bucket, an inch of fibre and a borrowed burner. Still amazed when it works.',
  ),
];
