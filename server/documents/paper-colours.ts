/** The light scheme of the product's tokens: paper is always light. */
export const INK = '#1A1D1F';
export const INK_2 = '#45494A';
export const INK_3 = '#5E615F';
export const LINE = '#DAD6CB';
export const LINE_2 = '#7E7B72';
export const PRIMARY = '#1C4A63';
export const OK_FILL = '#0B6B55';
export const OK_TEXT = '#0A5F4B';
