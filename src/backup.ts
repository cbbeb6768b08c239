import { en } from './phrases/index.ts';
import { argument, onRecords } from './records.ts';
import { backup } from './store/index.ts';

const file = argument(en.records.backupUsage);
if (file !== null) {
  await onRecords(async (place) => {
    await backup(place, file);
    return en.records.backedUp(file);
  });
}
