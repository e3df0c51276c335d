import { quickText } from '@/shared/text/quick';

/** The four places of groups on a single bond, as seen from the front. */
export type Side = 'front' | 'rear';
export interface Slot { side: Side; at: 0 | 1 }
export const SLOTS: readonly (Slot & { label: string })[] = [
  { side: 'front', at: 0, label: quickText.slots.frontClockwise },
  { side: 'front', at: 1, label: quickText.slots.frontCounter },
  { side: 'rear', at: 0, label: quickText.slots.rearClockwise },
  { side: 'rear', at: 1, label: quickText.slots.rearCounter },
];
export const slotLabel = (slot: Slot): string => SLOTS.find(({ side, at }) => side === slot.side && at === slot.at)?.label ?? '';
