/** Settings in force and places of files, for people. */

import { columns } from '../../term/columns.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import type { Place } from '../places.ts';
import type { SettingsContent } from '../read-settings.ts';
import type { SettingInForce } from '../settings-in-force.ts';
import { labelled, page, paragraph } from './page.ts';

export interface ConfigPage {
  readonly file: SettingsContent;
  readonly settings: readonly SettingInForce[];
  readonly places: readonly Place[];
}

export function configText({ file, settings, places }: ConfigPage, style: NumberStyle): string {
  const heads = [{ title: 'setting' }, { title: 'value' }, { title: 'from' }, { title: 'what it is' }];
  return page(
    [
      ...columns(
        heads,
        settings.map((one) => [one.name, valueText(one.value), originText(one), one.meaning]),
        { ascii: style.ascii, indent: 0 },
      ),
      '',
      ...places.flatMap((one) => [
        ...labelled(one.name, one.path ?? 'nowhere: there is no home folder', 13),
        ...labelled('', `${one.meaning}; ${stateText(one, file)}; place by ${originText(one)}`, 13),
      ]),
      ...(file.problems.length === 0
        ? []
        : [
            '',
            'The settings file',
            ...file.problems.flatMap((problem) => paragraph(`!  ${problem}`, 0, 3)),
            ...(file.state === 'broken' ? ['   It is left as it is, and nothing of it is used.'] : []),
          ]),
    ],
    style.ascii,
  );
}

export function valueText(value: SettingInForce['value']): string {
  if (value === true) return 'yes';
  if (value === false) return 'no';
  if (typeof value === 'number') return value === 0 ? 'none' : String(value);
  if (typeof value === 'string') return value;
  return value.length === 0 ? 'none' : `${value.length} changed`;
}

/** "default", "--ascii", "NO_COLOR in the environment", "color in the file". */
export function originText({ from, where }: Pick<SettingInForce, 'from' | 'where'>): string {
  if (where === undefined || from === 'flag') return where ?? from;
  return from === 'environment' ? `${where} (env.)` : 'settings file';
}

function stateText({ name, exists }: Place, file: SettingsContent): string {
  if (name === 'settings' && file.state === 'broken') return 'BROKEN, see below';
  return exists ? 'there' : 'not there';
}
