import { parseArgs } from 'node:util';
import { broodMoves } from '@/lib/brood/hmm/brood-moves';
import { cellModel } from '@/lib/brood/hmm/cell-model';
import { type CellRecord, historyAnswer } from '@/lib/brood/hmm/history-answer';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { GENUS_ROW } from '@/lib/brood/durations';
import { estimateNest } from '@/lib/brood/estimate-nest';
import { broodModel } from '@/lib/brood/nest-model/brood-model';
import { DEFAULT_CONFUSION } from '@/lib/brood/nest-model/confusion';
import { DenseCore } from '@/tests/support/brood/dense-fast';
import { type NestShape, simulatedReadings, simulatedRecords } from './brood-nests';

/** One thing to measure. */
export interface Point extends NestShape {
  /** `nest`: the whole estimate with its seven nodes; `core`: the core beside the dense implementation, one node. */
  kind: 'nest' | 'core';
}
