import { FillInChoice } from '@/components/ui/fill-in';
import { Section } from '@/components/ui/page-head';
import { boardChoices, type BoardChoice } from '@/lib/contracts/lot-view';
import { count } from '../numbers';
import { LotBoardsTable } from './lot-boards-table';
import type { LotSectionProps } from './lot-section';

const choices = boardChoices.map((value) => ({ value, label: value }));

/** Every board with its newest values, a page at a time. */
export function LotBoardsSection({ lot, view, changeView }: LotSectionProps) {
  const { summary, boardsChosen } = lot;
  return (
    <Section
      title={
        <span className="flex items-center gap-2 font-normal">
          Show{' '}
          <FillInChoice
            label="Boards"
            choices={choices}
            value={view.boards}
            onChange={(event) => changeView({ boards: event.target.value as BoardChoice, page: 1 })}
          />{' '}
          boards
        </span>
      }
      aside={
        <span>
          <b>{count(boardsChosen)}</b> of {count(summary.size)}
          {summary.runsWithoutVerdict > 0 ? `, ${summary.runsWithoutVerdict} runs without a verdict` : ''}
        </span>
      }
    >
      <LotBoardsTable
        boards={lot.boards}
        chosen={boardsChosen}
        boardTypeCode={lot.boardTypeCode}
        view={view}
        changeView={changeView}
      />
    </Section>
  );
}
