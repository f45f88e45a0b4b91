import type { Box } from '../board/labels.ts';

const WIDTH_PX = 292;
const HEIGHT_PX = 40;

/** Where the view tools may lie over a drawing of this width (`viewTools.css` puts them there): labels keep clear of it. */
export const viewToolsBox = (boardWidthPx: number): Box => ({
  xPx: boardWidthPx - WIDTH_PX,
  yPx: 0,
  widthPx: WIDTH_PX,
  heightPx: HEIGHT_PX,
});
