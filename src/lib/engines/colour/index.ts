/** Colour spaces, colour difference, other readers' eyesight, contrast. */
export { channelsOf, hexOf, readHex, type Triple } from './hex.ts';
export { clipped, fromLinear, hexOfLinear, linearOf, toLinear } from './srgb.ts';
export { labOf, labOfLinear } from './lab.ts';
export { hexOfOklab, linearOfOklab, oklabOf, oklabOfLinear } from './oklab.ts';
export { ciede2000 } from './ciede2000.ts';
export { readers, type Reader } from './reader.ts';
export { asSeenBy, seenLinear, tritanSecondOpinion } from './vision.ts';
export { contrast, labelInk, luminance } from './contrast.ts';
