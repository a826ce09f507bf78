/** Below the picture, where there is room: reflectance over the angle and over the wavelength, the boundary between them. */
import { Box } from 'ink';
import { useMemo } from 'react';
import type { Answer } from '../../answer/answer.ts';
import { degreesText } from '../../present/interface-rows.ts';
import { METRE } from '../../units/display-unit.ts';
import { formatQuantity } from '../../units/format-quantity.ts';
import { boundaryColumn } from '../picture/plan.ts';
import { sceneOf } from '../picture/scene.ts';
import { angleCurves } from '../reflectance-curves.ts';
import { answerOf, type State } from '../state.ts';
import { paint } from '../theme.ts';
import { curveView, type Plot, scaleTop } from '../view/curve-view.ts';
import { penOf } from '../view/pen.ts';
import { closingView } from '../view/strip-view.ts';
import { placeOfWavelength, waveCurve } from '../wave-curve.ts';
import type { World } from '../world.ts';
import { Lines } from './lines.tsx';
import type { ScreenProps } from './screen.tsx';

export function Curves({ state, world }: ScreenProps) {
  const { plan } = sceneOf(state, world);
  const answer = answerOf(state);
  const pen = penOf(state);
  const { glyphs } = state.preferences;
  const boundary = boundaryColumn(plan);
  const rows = plan.curve - 1;
  // biome-ignore lint/correctness/useExhaustiveDependencies: pen and style follow from the preferences
  const angle = useMemo(() => {
    if (!answer) return '';
    return curveView(anglePlot(answer, glyphs === 'ascii'), boundary, rows, glyphs, pen).join('\n');
  }, [answer, boundary, rows, state.preferences]);
  const plot = answer ? wavePlot(state, answer, world) : undefined;
  const wave = plot ? curveView(plot, plan.columns - boundary - 1, rows, glyphs, pen).join('\n') : '';
  const rail = new Array<string>(rows).fill(paint(pen.glyphs.rail, pen.theme.boundary)).join('\n');
  return (
    <Box flexDirection="column" height={plan.curve}>
      <Lines text={closingView(plan, pen)} />
      <Box>
        <Box width={boundary}>
          <Lines text={angle} />
        </Box>
        <Lines text={rail} />
        <Lines text={wave} />
      </Box>
    </Box>
  );
}

function anglePlot(answer: Answer, ascii: boolean): Plot {
  const { incidenceAngle_rad } = answer.geometry;
  const style = { ascii };
  return {
    title: 'R over the angle of incidence, s and p',
    curves: angleCurves(answer),
    top: 1,
    ends: [degreesText(0, 0, style), degreesText(Math.PI / 2, 0, style)],
    present: { x: incidenceAngle_rad / (Math.PI / 2), text: degreesText(incidenceAngle_rad, 2, style) },
  };
}

function wavePlot(state: State, answer: Answer, world: World): Plot {
  const style = { ascii: state.preferences.glyphs === 'ascii' };
  const length = (x: number): string => formatQuantity(x, METRE, { significant: 4 }, { style });
  const found = waveCurve(state.question, answer, world);
  const { polarization } = answer.geometry;
  const title = `R over the vacuum wavelength, ${polarization}`;
  if (!found) {
    const instead = found === null ? 'the same at every wave: no dispersion is known' : 'working it out';
    return { title, curves: [], top: 1, ends: ['', ''], present: null, instead };
  }
  const x = placeOfWavelength(found.range_m, answer.wave.vacuumWavelength_m);
  const isInside = x >= 0 && x <= 1;
  return {
    title,
    curves: [found.curve],
    top: scaleTop(found.top),
    ends: [length(found.range_m[0]), length(found.range_m[1])],
    present: isInside ? { x, text: length(answer.wave.vacuumWavelength_m) } : null,
  };
}
