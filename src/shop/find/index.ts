/** Everything a shop has told, found again by words. */
export { dropFromFind, type Findable, type ForFind, putForFind } from './put.ts';
export { type FindOptions, type Found, findEntries } from './search.ts';
export { nearestWords } from './spelt.ts';
export { hasWords } from './terms.ts';
