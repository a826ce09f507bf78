/**
 * Every action a key can cause, in one table: footer, help, remapping and the check for clashes are made from it.
 * A chord is written as the key stream names it: 'q', 'G', 'space', 'ctrl+c', 'shift+tab', 'page-down'.
 */
export const CONTEXTS = ['picture', 'entry', 'search', 'page', 'curve'] as const;
/** `picture`: moving about; `entry`: typing a value; `search`: choosing a medium; `page`: reading; `curve`: reading off. */
export type Context = (typeof CONTEXTS)[number];

export interface Action {
  readonly id: ActionId;
  readonly keys: readonly string[];
  readonly contexts: readonly Context[];
  /** Few letters, for the footer. */
  readonly label: string;
  /** One line, for the help. */
  readonly help: string;
}

export const ACTION_IDS = [
  'go-from',
  'go-into',
  'go-wave',
  'go-angle',
  'polarization',
  'search',
  'swap',
  'axis',
  'brewster',
  'critical',
  'reference',
  'go-beam',
  'go-conditions',
  'go-tolerance',
  'go-layers',
  'extrapolate',
  'up',
  'down',
  'left',
  'right',
  'next-field',
  'previous-field',
  'first',
  'last',
  'page-up',
  'page-down',
  'open',
  'step-up',
  'step-down',
  'fine-up',
  'fine-down',
  'unset',
  'undo',
  'redo',
  'copy',
  'copy-record',
  'log',
  'curves',
  'sources',
  'cautions',
  'coatings',
  'order-check',
  'compare',
  'dots',
  'take',
  'take-next',
  'take-previous',
  'cancel',
  'cursor-left',
  'cursor-right',
  'word-left',
  'word-right',
  'line-start',
  'line-end',
  'delete-back',
  'delete-forward',
  'kill-word-back',
  'kill-word-forward',
  'kill-to-start',
  'kill-to-end',
  'yank',
  'back',
  'help',
  'quit',
  'suspend',
  'redraw',
  'interrupt',
] as const;
export type ActionId = (typeof ACTION_IDS)[number];

type Row = readonly [ActionId, string, string, string];

/** id, keys separated by blanks, footer label, help. */
const PICTURE: readonly Row[] = [
  ['go-from', 'f', 'from', 'choose the medium the wave comes from'],
  ['go-into', 'i', 'into', 'choose the medium the wave goes into'],
  ['go-wave', 'w', 'wave', 'type the wave, in any unit'],
  ['go-angle', 'a', 'angle', 'type the angle of incidence'],
  ['polarization', 'p', 'polarization', 'next polarization: unpolarized, s, p'],
  ['search', '/', 'medium', 'choose the medium of the half you are in; halfspace find lists them too'],
  ['swap', 'x', 'swap', 'swap the two media'],
  ['axis', 'o', 'axis', 'next crystal axis of the half you are in'],
  ['brewster', 'B', 'Brewster', 'go to the Brewster angle (least R_p)'],
  ['critical', 'C', 'critical', 'go to the critical angle'],
  ['reference', 'v', 'vacuum/air', 'take the wavelength in vacuum or in air'],
  ['go-beam', 'b', 'beam', 'type the beam: power, irradiance or field'],
  ['go-conditions', 'c', 'conditions', 'type the temperature; the other conditions stand beside it'],
  ['go-tolerance', 't', 'tolerance', 'type tolerances of wave, angle, index'],
  ['go-layers', 'm', 'layers', 'type the layers between the two media, such as n=1.38@qw'],
  ['extrapolate', 'E', 'extrapolate', 'use a fit outside its range, or stop doing so'],
  ['step-up', '+ =', 'more', 'one step up, or the next choice'],
  ['step-down', '- _', 'less', 'one step down, or the previous choice'],
  ['fine-up', '>', 'a bit more', 'a tenth of a step up'],
  ['fine-down', '<', 'a bit less', 'a tenth of a step down'],
  ['unset', 'backspace delete', 'unset', 'take the value away where it may be missing'],
  ['undo', 'u', 'undo', 'undo the last change'],
  ['redo', 'ctrl+r', 'redo', 'do it again'],
  ['copy', 'y', 'copy', 'copy the value you are on; R and T elsewhere'],
  ['copy-record', 'Y', 'copy all', 'copy the whole answer as a record; halfspace log show prints one'],
  ['log', 'l', 'log', 'keep the answer in the logbook; halfspace log shows what is there'],
  [
    'curves',
    'r',
    'curves',
    'curves over the angle and the wave, of the indices and the field, with a cursor; --plot too',
  ],
  ['sources', 's', 'sources', 'where the numbers come from; halfspace cite says so too'],
  ['cautions', '!', 'cautions', 'all cautions in full'],
  [
    'coatings',
    'F',
    'coatings',
    'films and mirrors for these two media; Enter puts one between them; halfspace coat too',
  ],
  [
    'order-check',
    'O',
    'order check',
    'what to settle before this part is ordered; halfspace order-check too',
  ],
  ['compare', 'V', 'compare', 'the second medium versus the media chosen last; halfspace compare too'],
  ['dots', 'd', 'drawing', 'draw with braille, blocks or ASCII'],
  ['up', 'up k ctrl+p', 'up', 'up'],
  ['down', 'down j ctrl+n', 'down', 'down'],
  ['left', 'left', 'left', 'left'],
  ['right', 'right', 'right', 'right'],
  ['next-field', 'tab', 'next', 'next value that can be changed'],
  ['previous-field', 'shift+tab', 'previous', 'previous value that can be changed'],
  ['first', 'home g', 'top', 'top of the column'],
  ['last', 'end G', 'bottom', 'bottom of the column'],
  ['page-up', 'page-up ctrl+u alt+v', '10 more', 'ten steps up; a page up in a list'],
  ['page-down', 'page-down ctrl+d ctrl+v', '10 less', 'ten steps down; a page down in a list'],
  ['open', 'enter space', 'change', 'change the value you are on; its source if it is a result'],
  ['back', 'escape', 'back', 'leave the field; back to the last question that had an answer'],
  ['help', '?', 'keys', 'these keys'],
  ['quit', 'q', 'quit', 'quit'],
];

const LINE: readonly Row[] = [
  ['cursor-left', 'left', 'left', 'one character left'],
  ['cursor-right', 'right ctrl+f', 'right', 'one character right'],
  ['word-left', 'alt+b ctrl+left alt+left', 'word left', 'one word left'],
  ['word-right', 'alt+f ctrl+right alt+right', 'word right', 'one word right'],
  ['line-start', 'home ctrl+a', 'start', 'start of the line'],
  ['line-end', 'end ctrl+e', 'end', 'end of the line'],
  ['delete-back', 'backspace', 'delete', 'delete the character before the cursor'],
  ['delete-forward', 'delete', 'delete', 'delete the character under the cursor'],
  ['kill-word-back', 'ctrl+w alt+backspace', 'delete word', 'delete the word before the cursor'],
  ['kill-word-forward', 'alt+d', 'delete word', 'delete the word after the cursor'],
  ['kill-to-start', 'ctrl+u', 'clear', 'delete to the start of the line'],
  ['kill-to-end', 'ctrl+k', 'delete rest', 'delete to the end of the line'],
  ['yank', 'ctrl+y', 'put back', 'put back what was deleted last'],
  ['take', 'enter', 'take it', 'take what is typed or marked'],
  ['take-next', 'tab', 'take, next', 'take it and go to the next value'],
  ['take-previous', 'shift+tab', 'take, previous', 'take it and go to the previous value'],
  ['cancel', 'escape', 'keep the old', 'keep what was there before'],
];

const LIST: readonly Row[] = [
  ['up', 'up ctrl+p', 'up', 'previous medium'],
  ['down', 'down ctrl+n', 'down', 'next medium'],
  ['page-up', 'page-up alt+v', 'page up', 'a page up'],
  ['page-down', 'page-down ctrl+v', 'page down', 'a page down'],
];

const PAGE: readonly Row[] = [
  ['up', 'up k ctrl+p N', 'up', 'up; to the line found before'],
  ['down', 'down j ctrl+n n', 'down', 'down; to the next line found'],
  ['page-up', 'page-up ctrl+u alt+v', 'page up', 'a page up'],
  ['page-down', 'page-down ctrl+d ctrl+v space', 'page down', 'a page down'],
  ['first', 'home g', 'top', 'top'],
  ['last', 'end G', 'bottom', 'bottom'],
  ['copy', 'y', 'copy', 'copy what is shown'],
  ['sources', 's', 'sources', 'sources, and back to the numbers'],
  ['cautions', '!', 'cautions', 'cautions, and back to the numbers'],
  ['coatings', 'F', 'coatings', 'coatings, and back to the numbers'],
  ['order-check', 'O', 'order check', 'the order check, and back to the numbers'],
  ['compare', 'V', 'compare', 'the comparison, and back to the numbers'],
  ['open', 'enter', 'put it in', 'put the marked coating between the media'],
  ['search', '/', 'find', 'show only the lines that hold a word'],
  ['help', '?', 'keys', 'the keys, and back'],
  ['back', 'escape q left h backspace', 'back', 'back to the numbers'],
];

const CURVE: readonly Row[] = [
  ['left', 'left', 'left', 'one column to the left'],
  ['right', 'right', 'right', 'one column to the right'],
  ['page-up', 'page-up ctrl+u alt+v', '10 left', 'ten columns to the left'],
  ['page-down', 'page-down ctrl+d ctrl+v', '10 right', 'ten columns to the right'],
  ['first', 'home g', 'start', 'start of the axis'],
  ['last', 'end G', 'end', 'end of the axis'],
  ['curves', 'r tab space', 'next curve', 'over the angle, over the wave, indices, field'],
  ['open', 'enter', 'ask there', 'ask at the angle or the wave under the cursor'],
  ['copy', 'y', 'copy', 'copy what the cursor reads off'],
  ['log', 'l', 'log', 'keep the answer in the logbook'],
  ['help', '?', 'keys', 'these keys'],
  ['back', 'escape q backspace', 'back', 'back to the numbers'],
];

const ALWAYS: readonly Row[] = [
  ['interrupt', 'ctrl+c', 'quit', 'quit at once, from anywhere'],
  ['suspend', 'ctrl+z', 'suspend', 'to the shell; fg comes back'],
  ['redraw', 'ctrl+l', 'redraw', 'draw the screen anew'],
];

const rows = (table: readonly Row[], ...contexts: readonly Context[]): readonly Action[] =>
  table.map(([id, keys, label, help]) => ({ id, keys: keys.split(' '), contexts, label, help }));

export const ACTIONS: readonly Action[] = [
  ...rows(PICTURE, 'picture'),
  ...rows(LINE, 'entry', 'search'),
  ...rows(LIST, 'search'),
  ...rows(PAGE, 'page'),
  ...rows(CURVE, 'curve'),
  ...rows(ALWAYS, ...CONTEXTS),
];
