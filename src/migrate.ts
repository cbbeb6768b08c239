import { en } from './phrases/index.ts';
import { onRecords } from './records.ts';
import { migrate } from './store/index.ts';

await onRecords(async (place) => en.records.migrated(await migrate(place)));
