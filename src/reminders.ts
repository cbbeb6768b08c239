import { reminderEffects } from '../commands/knurl/questions/index.ts';
import { queued, SHOP_WORDS } from './desk/index.ts';
import { openReminders, type ReminderOptions, type Reminders, type Store } from './shop/index.ts';

/** Puts waiting questions up again, in the words and to the people that the commands give. */
export const openQuestionReminders = (
  store: Store,
  options: Omit<ReminderOptions, 'words' | 'effectsOf'>,
): Reminders =>
  openReminders(store, {
    ...options,
    words: SHOP_WORDS,
    effectsOf: async (view, putUp) => (await reminderEffects(view, putUp)).map(queued),
  });
