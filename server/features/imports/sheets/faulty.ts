import { FileRefusal } from '../refusal.ts';

/** Said of a workbook that only a password opens. */
export const locked = () =>
  new FileRefusal(
    'locked',
    'This workbook is protected by a password. Open it, save a copy without one, and bring that in.',
  );
/** Said of a workbook that ends too early or holds bytes that are none of its format. */
export const damaged = () =>
  new FileRefusal(
    'damaged',
    'This workbook is cut off or damaged. Open it in your spreadsheet program, save it anew, and bring that in.',
  );
/** Said of a workbook that unpacks to more than people ever type. */
export const tooLarge = () =>
  new FileRefusal(
    'too-large',
    'Unpacked, this workbook is larger than anything people type. Save the sheet as CSV and bring that in.',
  );
