import type { Palette } from './shapes';

/** The light roles as literal colors: a PDF knows no custom properties. */
export const PRINT_PALETTE: Palette = {
  ink: '#1c211d',
  ink2: '#4c554d',
  ink3: '#5f6960',
  hair: '#d3dad0',
  rule: '#9ea99e',
  sheet: '#ffffff',
  spruce: '#1e5b4b',
  eye: '#b4370f',
  skin: '#6b0f2e',
  aid: '#534f9e',
  stop: '#9b1c1c',
};

/** One ink: lanes are told apart by place, pattern and foot alone. */
export const ONE_INK_PALETTE: Palette = {
  ink: '#1c211d',
  ink2: '#4c554d',
  ink3: '#5f6960',
  hair: '#d3d3d3',
  rule: '#9e9e9e',
  sheet: '#ffffff',
  spruce: '#1c211d',
  eye: '#3c3c3c',
  skin: '#1c1c1c',
  aid: '#4c4c4c',
  stop: '#1c211d',
};
