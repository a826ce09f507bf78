/** The whole screen of a state: the picture, a page over it, or one line where there is no room for either. */
import { Box } from 'ink';
import { useMemo } from 'react';
import { fullLines, isSplitPage, markedLine, pageLength, pageRows } from '../picture/pages.ts';
import { sceneOf } from '../picture/scene.ts';
import { answerOf, type Page, type State } from '../state.ts';
import { footerView } from '../view/footer-view.ts';
import { headView } from '../view/head-view.ts';
import { noticeView } from '../view/notice-view.ts';
import { pageStatus, pageView } from '../view/page-view.ts';
import { lineOfSpans, penOf } from '../view/pen.ts';
import { openingView, stripView } from '../view/strip-view.ts';
import { tooSmallView } from '../view/too-small-view.ts';
import type { World } from '../world.ts';
import { CurveChart } from './curve-chart.tsx';
import { Curves } from './curves.tsx';
import { Halves } from './halves.tsx';
import { Lines } from './lines.tsx';
import { Part } from './part.tsx';

export interface ScreenProps {
  readonly state: State;
  readonly world: World;
}

export function Screen({ state, world }: ScreenProps) {
  const { plan, head, notice } = sceneOf(state, world);
  if (plan.kind === 'none') return <Lines text={tooSmallView(state.size).join('\n')} />;
  const pen = penOf(state);
  const { columns } = plan;
  const page = state.page;
  const isWholePage = page !== null && !isSplitPage(page, state, world);
  return (
    <Box flexDirection="column" width={columns}>
      <Lines text={headView(head, columns, pen).join('\n')} />
      {isWholePage ? (
        <WholePage state={state} page={page} world={world} />
      ) : (
        <Picture state={state} world={world} />
      )}
      {page ? (
        <PageNotice state={state} page={page} world={world} />
      ) : (
        <Lines text={noticeView(notice, plan.notice, columns, pen).join('\n')} />
      )}
      <Lines text={footerView(state, columns, pen, world)} />
    </Box>
  );
}

function Picture({ state, world }: ScreenProps) {
  const { plan } = sceneOf(state, world);
  if (state.curve && plan.curve === 0) return <CurveChart state={state} world={world} />;
  return (
    <>
      <Strip state={state} world={world} />
      {plan.kind === 'full' ? <Halves state={state} world={world} /> : <Part state={state} world={world} />}
      {plan.curve > 0 ? <LowerPart state={state} world={world} /> : null}
    </>
  );
}

function LowerPart({ state, world }: ScreenProps) {
  return state.curve ? <CurveChart state={state} world={world} /> : <Curves state={state} world={world} />;
}

/** Drawn anew only where the answer, the room or the signs change. */
function Strip({ state, world }: ScreenProps) {
  const { plan } = sceneOf(state, world);
  const answer = answerOf(state);
  const { glyphs, colour } = state.preferences;
  // biome-ignore lint/correctness/useExhaustiveDependencies: the pen follows from the preferences alone
  const text = useMemo(() => {
    const pen = penOf(state);
    const lines = stripView(answer, plan, glyphs, pen);
    return [...lines, ...(plan.kind === 'full' ? [openingView(plan, pen)] : [])].join('\n');
  }, [answer, glyphs, colour, plan.kind, plan.columns, plan.strip]);
  return text === '' ? null : <Lines text={text} />;
}

function WholePage({ state, page, world }: ScreenProps & { readonly page: Page }) {
  const { plan } = sceneOf(state, world);
  const lines = fullLines(state, page, world, plan.columns);
  const rows = pageRows(state, world);
  const marked = markedLine(page, lines, rows);
  const drawn = pageView(lines, page.top, rows, plan.columns, penOf(state), marked);
  return <Lines text={drawn.join('\n')} />;
}

/** Below a page: what it is narrowed to and how much is out of sight, then what was done last. */
function PageNotice({ state, page, world }: ScreenProps & { readonly page: Page }) {
  const { plan, notice } = sceneOf(state, world);
  const pen = penOf(state);
  const status = pageStatus(page, pageLength(state, world), pageRows(state, world));
  const lines = [
    lineOfSpans(status, plan.columns, pen),
    ...noticeView(notice, plan.notice - 1, plan.columns, pen),
  ];
  return <Lines text={lines.join('\n')} />;
}
