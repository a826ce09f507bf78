/** `halfspace config`: each setting, its value and where that comes from. Writes nothing: the full-screen program does. */
import type { Command } from '../context.ts';
import { places } from '../places.ts';
import { readSettingsContent } from '../read-settings.ts';
import { type ConfigPage, configText } from '../render/config-text.ts';
import { jsonDocument } from '../render/json-document.ts';
import { settingsInForce } from '../settings-in-force.ts';

export const run: Command = ({ options }, context) => {
  const { env, stdoutIsTTY } = context;
  const file = readSettingsContent(env);
  const page: ConfigPage = {
    file,
    settings: settingsInForce({ options, env, file, stdoutIsTTY }),
    places: places(options, env),
  };
  if (options.json) {
    context.write(jsonDocument({ version: context.version }, configBody(page), options.ascii === true));
  } else context.write(configText(page, { ascii: context.ascii }));
  return 0;
};

function configBody({ file, settings, places: list }: ConfigPage) {
  return {
    settingsFile: { path: file.path ?? null, state: file.state, problems: file.problems },
    settings: settings.map(({ where = null, ...setting }) => ({ ...setting, where })),
    places: list.map(({ where = null, path = null, ...place }) => ({ ...place, path, where })),
  };
}
