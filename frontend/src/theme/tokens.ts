/** A theme as drawn. "As the device" resolves to light or dark. */
export type ThemeName = 'light' | 'dark' | 'sun';

/** What a person picks in the name menu. */
export type ThemeChoice = ThemeName | 'device';

const light = {
  ground: '#ECEEEB',
  paper: '#FDFDFB',
  paper2: '#F4F5F2',
  rule: '#D2D5CF',
  rule2: '#82877F',
  frame: '#1C1A22',
  ink: '#1C1A22',
  ink2: '#484651',
  ink3: '#62606B',
  primer: '#5B2C90',
  primerStrong: '#43206C',
  primerWash: '#F0E9F7',
  onPrimer: '#FFFFFF',
  water: '#0A659B',
  waterFill: '#9FCDE6',
  waterWash: '#E4F1F8',
  brass: '#7A5300',
  brassFill: '#D9A21B',
  brassWash: '#FBF0D0',
  onBrass: '#1C1A22',
  green: '#15643A',
  greenWash: '#E0F1E5',
  onGreen: '#FFFFFF',
  red: '#A81C1C',
  redWash: '#FBE7E4',
  onRed: '#FFFFFF',
  hatch: '#9BA097',
  poche: '#BFC3BB',
  shadow: '0 10px 28px rgba(28, 26, 34, 0.16)',
};

/** Names of the colours; `tokens.css` carries the same names as custom properties. */
export type TokenName = keyof typeof light;
export type Tokens = Record<TokenName, string>;

const dark: Tokens = {
  ground: '#0D0B12',
  paper: '#16131D',
  paper2: '#1F1B28',
  rule: '#3A3445',
  rule2: '#837C92',
  frame: '#837C92',
  ink: '#F1EEF6',
  ink2: '#CBC6D5',
  ink3: '#A8A2B5',
  primer: '#C29BF5',
  primerStrong: '#D8BEFA',
  primerWash: '#2C2140',
  onPrimer: '#16131D',
  water: '#74C6F3',
  waterFill: '#1F638A',
  waterWash: '#142B3B',
  brass: '#EDC258',
  brassFill: '#D9A21B',
  brassWash: '#352A12',
  onBrass: '#16131D',
  green: '#72D39A',
  greenWash: '#15301F',
  onGreen: '#16131D',
  red: '#FF9A91',
  redWash: '#401B1B',
  onRed: '#16131D',
  hatch: '#5E5769',
  poche: '#4B4457',
  shadow: '0 12px 32px rgba(0, 0, 0, 0.6)',
};

/** For phones outdoors: no washes (an edge in the wash's colour instead), darker words. */
const sun: Tokens = {
  ...light,
  ground: '#FFFFFF',
  paper: '#FFFFFF',
  paper2: '#FFFFFF',
  rule: '#8A8792',
  rule2: '#4C4A54',
  frame: '#000000',
  ink: '#000000',
  ink2: '#26242C',
  ink3: '#26242C',
  primer: '#4A1F80',
  primerStrong: '#36155F',
  primerWash: '#FFFFFF',
  water: '#074E79',
  waterFill: '#8EC2DF',
  waterWash: '#FFFFFF',
  brass: '#5F4100',
  brassWash: '#FFFFFF',
  green: '#0E4F2D',
  greenWash: '#FFFFFF',
  red: '#8C1111',
  redWash: '#FFFFFF',
  hatch: '#6A6870',
};

export const themes: Record<ThemeName, Tokens> = { light, dark, sun };

export const sansFamily = '"IBM Plex Sans", system-ui, sans-serif';
export const monoFamily = '"IBM Plex Mono", ui-monospace, monospace';
