/** A code is read as one wherever it may stand, whatever else a reader could make of its signs. */
import { expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { openDesk, plainShop } from '../../../src/desk/index.ts';

const FORMS = [
  '/knurl card CODE',
  '/knurl result CODE good',
  '/knurl result good card CODE',
  '/knurl standard save TH-2041-B card CODE',
  '/knurl standard propose TH-2041-B card CODE',
  '/knurl standard propose card CODE',
  '/knurl standard revise TH-2041-B card CODE why it rubs less',
  '/knurl ask CODE why does it double',
  '/knurl questions CODE',
  '/knurl answer CODE yes',
  '/knurl solved CODE answer 1',
  '/knurl reopen CODE',
];

/** Sizes, counts and units to a reader of numbers; some once came back as a word nobody knows. */
const CODES = ['9X2T4', 'X363X', '6X66H', '73X34', 'X64X3', 'K7M2X', '2PM6K', 'P86P8'];

test.each(FORMS)('%s', async (form) => {
  const desk = openDesk(FLEET, plainShop('in'));
  for (const code of CODES) {
    const answer = await desk.answer({
      shop: '',
      person: { id: 'ines', name: 'Ines' },
      place: { channel: 'floor', thread: null, isPrivate: false },
      interactionId: code,
      given: { words: form.replace('CODE', code) },
    });
    // Read to the end: all that is missing here is the records to look it up in.
    expect({ code, answer }).toMatchObject({ answer: { refusal: { code: 'unavailable' } } });
  }
});
