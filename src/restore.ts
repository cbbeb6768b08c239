import { en } from './phrases/index.ts';
import { argument, onRecords } from './records.ts';
import { restore } from './store/index.ts';

const file = argument(en.records.restoreUsage);
if (file !== null) {
  await onRecords(async (place) => {
    const { setAside } = await restore(place, file);
    return en.records.restored(file, setAside);
  });
}
