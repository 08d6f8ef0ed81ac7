/** The light tokens on white paper; each mark also differs in shape, weight or dash, so that grey paper tells them apart. */
export const ink = '#1d2530';
export const softInk = '#566070';
export const hairline = '#d9d3c7';
export const edge = '#857e6e';
export const copper = '#a0481b';
export const copperWash = '#f1e3d9';
export const slate = '#667080';
export const plum = '#6b3e75';
export const plumWash = '#e9e0e8';
export const plumWashStrong = '#d8c9da';
export const ochre = '#8a6100';
export const paper = '#ffffff';
