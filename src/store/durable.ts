import fs from 'node:fs';
import path from 'node:path';

/** Writes what the system still holds back of a file or folder to the disk. */
export const toDisk = (place: string): void => {
  let handle: number;
  try {
    handle = fs.openSync(place, 'r');
  } catch (error) {
    // Some systems do not open a folder; they keep its entries by themselves.
    if (fs.statSync(place).isDirectory()) return;
    throw error;
  }
  try {
    fs.fsyncSync(handle);
  } finally {
    fs.closeSync(handle);
  }
};

/** Gives a finished file its name: whoever looks sees all of it or nothing. */
export const putInPlace = (draft: string, file: string): void => {
  toDisk(draft);
  fs.renameSync(draft, file);
  toDisk(path.dirname(file));
};

/** A name beside a file for what is not finished. */
export const draftOf = (file: string): string => `${file}.${process.pid}.draft`;
