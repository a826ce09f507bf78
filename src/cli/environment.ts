/** The environment variables that are read, for help and man page. */
export const ENVIRONMENT: readonly (readonly [names: string, meaning: string])[] = [
  ['NO_COLOR', 'not empty: no colour, all else as it is'],
  ['FORCE_COLOR', '0 or false: no colour; else not empty: colour on the screen, whatever the terminal'],
  ['TERM', 'dumb: no colour, no full-screen program'],
  ['COLUMNS, LINES', 'size of the terminal where it tells none'],
  ['LC_ALL, LC_CTYPE, LANG', 'a locale other than UTF-8: as --ascii'],
  ['HALFSPACE_ACCESSIBLE, ACCESSIBLE', 'not empty, not 0 or false: as --linear'],
  ['INK_SCREEN_READER', 'true: as --linear'],
  ['HALFSPACE_DEBUG', 'not empty: an internal error shows where it arose'],
  ['TMUX, STY', 'set by tmux and Screen: how copied text gets through them'],
  ['HOME', 'where the folders below are unless the next four say otherwise'],
  ['XDG_CONFIG_HOME', 'settings, in the folder halfspace; else ~/.config'],
  ['XDG_DATA_HOME', 'entries of your own, in halfspace/materials; else ~/.local/share'],
  ['XDG_STATE_HOME', 'the logbook, in the folder halfspace; else ~/.local/state'],
  ['XDG_CACHE_HOME', 'what can be made anew, in the folder halfspace; else ~/.cache'],
];
