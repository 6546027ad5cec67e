import { connectModels } from '@/models';
import { database } from './connection';

// The one door to the tables: models tied to the application's pool. Everything in lib/ that reads or
// writes records imports them from here, so that no model is ever used before it is tied.
connectModels(database());

export * from '@/models';
