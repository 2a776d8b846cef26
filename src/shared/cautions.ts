/** A fact a firer must know, with where it is published. */
export interface CautionLine {
  readonly text: string;
  readonly source: string;
}
export interface CautionGroup {
  readonly title: string;
  readonly lines: readonly CautionLine[];
}

const FROM_MEMORY = 'From memory; common practice in the trade.';

/** The cautions, in the order of a firing. */
export const CAUTIONS: readonly CautionGroup[] = [
  {
    title: 'Before lighting',
    lines: [
      {
        text: 'Fire outdoors only, never in a garage, tent or shed. Carbon monoxide has no smell and can kill; first signs are headache, tiredness and dizziness: go to fresh air and get medical help.',
        source: 'US Consumer Product Safety Commission, as quoted by a town’s safety page.',
      },
      {
        text: 'Leak-test every joint with soapy water, before lighting and after any change. Bubbles mean a leak.',
        source: 'Dealers’ and home safety sheets for propane.',
      },
      {
        text: 'If you smell gas: close the cylinder valve, leave flames and switches alone, move people away.',
        source: 'Gas suppliers’ advice on leaks.',
      },
      {
        text: 'Propane is one and a half times as heavy as air: leaked gas lies in pits, drains and cellars.',
        source: 'NFPA 58 property table (relative density 1.5).',
      },
      {
        text: 'Keep cylinders upright, secured and in the open air. Never heat a cylinder, whatever the weather.',
        source:
          'Guidance for LPG cylinder storage; Lemmon, McLinden and Wagner 2009 for the pressure.',
      },
      {
        text: 'Wear cotton or leather and no synthetics, tie hair up; gauntlets, infrared-rated eyewear, a respirator for smoke, fibre dust and metal salts.',
        source: 'From memory; EN 171 rates infrared filters.',
      },
      {
        text: 'Clear the ground; keep water and a lid for each bin near, people and animals away. Check fire bans and wind.',
        source: FROM_MEMORY,
      },
    ],
  },
  {
    title: 'Lighting and relighting',
    lines: [
      {
        text: 'Open the lid or door to light. Have the flame at the burner first, then the gas, so that gas never gathers in the chamber. Stand aside of port and flue.',
        source:
          'North Carolina Department of Labor, Furnace Explosions; European Process Safety Centre card on igniting burners.',
      },
      {
        text: 'If it goes out: gas off, open the kiln, let it air before another try. Five minutes is common practice.',
        source: 'The same two sources; the five minutes are common practice, no source.',
      },
      {
        text: 'Shut down in the order the burner’s maker gives; leave no gas in the hose; close the cylinder.',
        source: FROM_MEMORY,
      },
    ],
  },
  {
    title: 'Drawing and smoking',
    lines: [
      {
        text: 'Lift a reduction lid away from you, face back: the smoke can catch all at once.',
        source: FROM_MEMORY,
      },
      {
        text: 'Water on hot ware makes steam. Add it slowly, at arm’s length.',
        source: FROM_MEMORY,
      },
      {
        text: 'A pot at 900 to 1000 °C can crack or spit glaze. Agree who moves, and clear the way first.',
        source: FROM_MEMORY,
      },
      {
        text: 'Copper, manganese, chrome, lead or cadmium in glazes and fumed salts can give off toxic fume. Read each safety data sheet.',
        source: 'From memory; lists of IARC and ACGIH.',
      },
    ],
  },
  {
    title: 'Fibre, dust and ware',
    lines: [
      {
        text: 'Ceramic fibre may cause cancer when its dust is breathed. Cover or rigidise the lining; wear a fitted respirator when cutting or removing it. Old lining is the dustier hazard.',
        source: 'IARC Monographs 43 (1988) and 81 (2002); CAREX Canada profile.',
      },
      {
        text: 'Silica dust causes silicosis. Clean wet, never dry-sweep.',
        source: 'IARC Monographs 68 and 100C; European Agency for Safety and Health at Work.',
      },
      {
        text: 'Raku ware is porous and its glazes craze: it is not for food or drink.',
        source: FROM_MEMORY,
      },
    ],
  },
  {
    title: 'What a screen cannot tell',
    lines: [
      {
        text: 'Colours on a screen are a drawing. Do not judge a kiln by them.',
        source: 'Heat-colour tables differ by 50 to 100 °C between authors.',
      },
      {
        text: 'A type K probe may be wrong by 7.5 °C at 1000 °C by its wire alone, and by far more from its place. No number on a screen says that it is safe to act.',
        source: 'IEC 60584-2, class 2.',
      },
      {
        text: 'Have burner, regulator, hose and pipework checked by a licensed gas engineer; follow local gas, fire and building codes and the makers’ instructions. Notes are members’ accounts, not a licensed person’s advice.',
        source: 'Gas safety registers and local codes.',
      },
    ],
  },
];

/** The few that stand beside a firing or a change, in one breath. */
export const CAUTIONS_IN_BRIEF =
  'Outdoors only. Flame first, then gas; if it goes out, gas off, open up and let it air. Stand aside of port and flue, never heat a cylinder, and have the gas set-up checked by a licensed gas engineer.';
