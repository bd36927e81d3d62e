import { bindery } from './bindery.ts';
import { editor } from './editor.ts';
import { larder } from './larder.ts';
import { margin } from './margin.ts';
import { plates } from './plates.ts';
import { recipes } from './recipes.ts';
import { shoots } from './shoots.ts';
import { workroom } from './workroom.ts';

/** Everything the workroom says, one file for each of its rooms. */
export const workroomArea = { ...workroom, bindery, editor, larder, margin, plates, recipes, shoots };
