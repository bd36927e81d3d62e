import { common } from './common.ts';
import { errors } from './errors.ts';
import { front } from './front.ts';
import { office } from './office.ts';
import { reading } from './reading.ts';
import { words } from './words.ts';
import { workroom } from './workroom.ts';

export const en = { common, errors, front, office, reading, words, workroom };
