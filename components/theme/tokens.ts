/**
 * The one place with colours, sizes and spacings. Everything else names a token.
 * brightfield is the light theme, darkfield the one for the microscope room.
 */
export type ThemeName = 'brightfield' | 'darkfield';

export interface Colours {
  ground: string;
  sheet: string;
  /** Label end of the version slide, chosen segment. */
  frost: string;
  /** The current row. */
  wash: string;
  hairline: string;
  /** Control borders and axis ticks, at least 3:1. */
  tick: string;
  ink: string;
  inkSoft: string;
  /** Acts, focus, selection, the point on the axis, the section; nothing else. */
  cresyl: string;
  cresylPressed: string;
  onCresyl: string;
  cells: string;
  neurons: string;
  other: string;
  mass: string;
  settled: string;
  waiting: string;
  flagged: string;
  settledWash: string;
  waitingWash: string;
  flaggedWash: string;
  scrim: string;
}

export type QuantityName = 'cells' | 'neurons' | 'other' | 'mass';
export type StateTone = 'settled' | 'waiting' | 'flagged';
export type Tone = QuantityName | StateTone | 'ink' | 'inkSoft' | 'cresyl' | 'onCresyl' | 'ground';

export const colours: Record<ThemeName, Colours> = {
  brightfield: {
    ground: '#F4F4F8',
    sheet: '#FFFFFF',
    frost: '#E7E3F0',
    wash: '#EDEBF4',
    hairline: '#DAD7E3',
    tick: '#878199',
    ink: '#1B1724',
    inkSoft: '#565064',
    cresyl: '#5A2E91',
    cresylPressed: '#46216F',
    onCresyl: '#FFFFFF',
    cells: '#1F4FD8',
    neurons: '#A3195B',
    other: '#7A5200',
    mass: '#3C4A57',
    settled: '#0B6B5C',
    waiting: '#8A5300',
    flagged: '#B93A00',
    settledWash: '#E4F1EE',
    waitingWash: '#F8EEDD',
    flaggedWash: '#FBEAE2',
    scrim: 'rgba(27,23,36,0.38)',
  },
  darkfield: {
    ground: '#0E0C13',
    sheet: '#17141F',
    frost: '#251E36',
    wash: '#201B2C',
    hairline: '#322C40',
    tick: '#766E8C',
    ink: '#EFECF5',
    inkSoft: '#ABA3BC',
    cresyl: '#B795F0',
    cresylPressed: '#CDB4F7',
    onCresyl: '#1A1028',
    cells: '#8FB0FF',
    neurons: '#FF8FB8',
    other: '#E5B567',
    mass: '#B7C3CE',
    settled: '#57C7B2',
    waiting: '#E9B44C',
    flagged: '#FF8A5C',
    settledWash: '#12251F',
    waitingWash: '#2A2212',
    flaggedWash: '#301B13',
    scrim: 'rgba(4,3,7,0.6)',
  },
};

export const space = { xxs: 4, xs: 8, s: 12, m: 16, l: 20, xl: 24, xxl: 32, xxxl: 40 } as const;
export const radius = { control: 3, stamp: 3, image: 2 } as const;
export const focusRing = { width: 2, offset: 2 } as const;
export const target = { phone: 44, primaryPhone: 48, pad: 64, wide: 40 } as const;
export const breakpoints = { rail: 900, sideBySide: 1200 } as const;
export const rail = { width: 176, firstTick: 150, step: 78, majorTick: 11, minorTick: 5, pointRadius: 5.5 } as const;
export const bar = { height: 72, majorTick: 9, minorTick: 4, pointRadius: 5.5 } as const;
export const row = { dense: 34, table: 40, phone: 44 } as const;
/** About 72 characters of body text. */
export const readingWidth = 640;
export const margin = { phone: 16, wide: 40 } as const;
export const figure = {
  markRadiusWide: 5,
  markRadiusPhone: 4.2,
  line: 1.8,
  bandOpacity: { brightfield: 0.15, darkfield: 0.22 },
  majorTick: 9,
  minorTick: 5,
  flagRing: 2.1,
  selectedRing: 5,
  hollowStroke: 1.6,
  halo: 4,
} as const;
export const strip = { height: 26, centreTick: 18, bandHeight: 12, rangeDense: 4, rangeStandard: 6 } as const;
