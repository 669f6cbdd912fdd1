/**
 * The tokens of the look. Both themes carry the same names, so a component asks for `ink` and never for a colour.
 * Text on its ground is at least 7:1 and control borders at least 3:1: tests/components/theme-contrast.test.ts computes both.
 */
const light = {
  /** Page. */
  chalk: '#F3F0E8',
  /** Cards, keys, fields. */
  paper: '#FFFDF8',
  /** Text, primary buttons. */
  ink: '#15181C',
  /** Secondary text. */
  ink2: '#4B5058',
  /** Hairlines. */
  rule: '#D8D2C4',
  /** Control borders. */
  rule2: '#8B867A',
  /** The string line and "you are here", and nothing else. */
  line: '#CF0F63',
  lineTint: '#FBE3EC',
  /** Above: lower it. */
  high: '#883200',
  highTint: '#FCE9DC',
  /** Below: raise it. */
  low: '#004E89',
  lowTint: '#DFECF7',
  /** Within tolerance. */
  on: '#005844',
  onTint: '#DDF0E8',
  /** Doubt, cautions, refused entries. */
  caution: '#614B00',
  cautionTint: '#F6ECC9',
};

export type TokenName = keyof typeof light;
export type Tokens = Readonly<Record<TokenName, string>>;

const dark: Tokens = {
  chalk: '#121417',
  paper: '#1C1F24',
  ink: '#F5F1E8',
  ink2: '#C2C0B9',
  rule: '#3A3E45',
  rule2: '#868A91',
  line: '#FF4D94',
  lineTint: '#42142A',
  high: '#FFB88F',
  highTint: '#40200E',
  low: '#93CBFF',
  lowTint: '#0E2E48',
  on: '#7FDDBF',
  onTint: '#0C352A',
  caution: '#EFD27C',
  cautionTint: '#382E08',
};

export const themes: Readonly<Record<'light' | 'dark', Tokens>> = { light, dark };

/** Gaps and paddings, in px. */
export const space = { xs: 4, s: 8, m: 12, l: 16, xl: 24 } as const;

/** Corner radii, in px. */
export const radius = { key: 8, button: 10, card: 12, verdict: 14, pill: 999 } as const;

/** Type sizes, in px. Nothing a person reads is under 13. */
export const typeSize = { tiny: 13, small: 15, text: 16, lead: 17, head: 20, title: 26, verdict: 34, giant: 58 } as const;
export type TypeSize = keyof typeof typeSize;

/** Least edge of anything that is pressed, in px; a shoot key is larger because it is pressed in a glove. */
export const target = { least: 48, shootHeight: 54, shootWidth: 80 } as const;

/** From this width, in px, a screen has its rail on the left and its content in columns. */
export const wideFrom = 900;
