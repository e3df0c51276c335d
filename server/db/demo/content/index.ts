import type { DemoCase } from '../story';
import { impurities } from './impurities';
import { piperidinols } from './piperidinols';
import { vinylOpen } from './vinylOpen';
import { vinylSigned } from './vinylSigned';

export const DEMO_CASES: readonly DemoCase[] = [...vinylSigned, ...vinylOpen, ...piperidinols, ...impurities];
