import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { BoardTypeEditor } from '@/components/desk/board-types/board-type-editor';
import { authorise } from '@/server/auth/authorise';
import { readBoardType } from '@/server/operations/engineering/board-types/read-board-type';
import {
  approveAction,
  askApprovalAction,
  beginDraftAction,
  discardDraftAction,
  saveDraftAction,
  sendBackAction,
  takeBackAction,
} from '../actions';

interface PageProps {
  params: Promise<{ code: string }>;
}

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  return { title: `Board type ${decodeURIComponent((await params).code)}` };
}

export default async function BoardTypePage({ params }: PageProps) {
  const actor = await authorise('signed-in');
  const page = await readBoardType(actor, decodeURIComponent((await params).code));
  if (!page) notFound();
  const { id, status } = page.shown;
  return (
    <BoardTypeEditor
      key={`${id}:${status}`}
      page={page}
      signer={actor.name}
      actions={{
        begin: beginDraftAction,
        save: saveDraftAction,
        discard: discardDraftAction,
        ask: askApprovalAction,
        takeBack: takeBackAction,
        approve: approveAction,
        sendBack: sendBackAction,
      }}
    />
  );
}
