import { useQuery } from '@tanstack/react-query';
import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useParams } from 'react-router-dom';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page } from '../../components/Page.tsx';
import { sharedRunQuery } from '../../features/sharing/api/sharedRun.ts';
import {
  sharedCardQuery,
  sharedDesignQuery,
  sharedStudyQuery,
  sharedSubjectQuery,
} from '../../features/sharing/api/sharedSubject.ts';
import { ClosedShare } from './ClosedShare.tsx';
import { OpenCard } from './OpenCard.tsx';
import { OpenDesign } from './OpenDesign.tsx';
import { OpenRun } from './OpenRun.tsx';
import { OpenStudy } from './OpenStudy.tsx';

/** `/share/:token`: what a link opens, for a reader without an account. It says nothing else of the group. */
export function SharePage() {
  const { token = '' } = useParams();
  const subject = useQuery(sharedSubjectQuery(token));
  return (
    <ShareGate query={subject} what="page">
      {({ opens }) => {
        switch (opens) {
          case 'run':
            return <SharedRunPage token={token} />;
          case 'design':
            return <SharedDesignPage token={token} />;
          case 'study':
            return <SharedStudyPage token={token} />;
          case 'card':
            return <SharedCardPage token={token} />;
        }
      }}
    </ShareGate>
  );
}

function SharedRunPage({ token }: { token: string }) {
  const run = useQuery(sharedRunQuery(token));
  return (
    <ShareGate query={run} what="run">
      {(data) => <OpenRun token={token} run={data} />}
    </ShareGate>
  );
}

function SharedDesignPage({ token }: { token: string }) {
  const design = useQuery(sharedDesignQuery(token));
  return (
    <ShareGate query={design} what="design">
      {(data) => <OpenDesign token={token} design={data} />}
    </ShareGate>
  );
}

function SharedStudyPage({ token }: { token: string }) {
  const study = useQuery(sharedStudyQuery(token));
  return (
    <ShareGate query={study} what="study">
      {(data) => <OpenStudy token={token} study={data} />}
    </ShareGate>
  );
}

function SharedCardPage({ token }: { token: string }) {
  const card = useQuery(sharedCardQuery(token));
  return (
    <ShareGate query={card} what="growth card">
      {(data) => <OpenCard token={token} card={data} />}
    </ShareGate>
  );
}

type GateProps<Data> = {
  query: UseQueryResult<Data>;
  what: string;
  children: (data: Data) => ReactNode;
};

function ShareGate<Data>({ query, what, children }: GateProps<Data>) {
  if (query.data !== undefined) return children(query.data);
  if (query.error) return <ClosedShare error={query.error} onRetry={() => void query.refetch()} />;
  return (
    <Page title={`Shared ${what}`}>
      <LoadingState label={`Opening the shared ${what}`} rows={8} />
    </Page>
  );
}
