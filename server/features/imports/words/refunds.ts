import { fold } from '../cells/fold.ts';

const REFUND =
  /^(?:returned|return of|refund|refunded|refund of|core return|core refund|core credit|credit for|money back|got back|gutschrift|ruckgabe|zuruck|erstattung|ruckerstattung|devolucion|devuelto|reembolso|abono|remboursement|retour|rendu|avoir)\b|\b(?:(?:parts?|core|yard|store|vendor|supplier) credit|refund|returned|gutschrift|reembolso|remboursement)$/;

/** Do a row's own words say that money came back? */
export const isRefund = (text: string | null) => text !== null && REFUND.test(fold(text));
