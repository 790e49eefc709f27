// @vitest-environment jsdom
import { act, cleanup, render, screen } from '@testing-library/react';
import { RouterProvider, createMemoryRouter } from 'react-router-dom';
import { afterEach, expect, it, vi } from 'vitest';
import { buildDocument } from '../model/stackFixtures.ts';
import { useView } from './useView.ts';

afterEach(() => {
  cleanup();
  vi.useRealTimers();
});

const saved = buildDocument().workingPoint;

function Page() {
  const [view, setView] = useView(saved);
  return (
    <button onClick={() => setView({ point: { ...saved, angleDeg: 44 } })}>{view.point.angleDeg}</button>
  );
}

function NextPage() {
  return <p>the next page</p>;
}

function open() {
  let arrive = () => {};
  const fetched = new Promise<{ Component: typeof NextPage }>((resolve) => {
    arrive = () => resolve({ Component: NextPage });
  });
  const router = createMemoryRouter([
    { path: '/', element: <Page /> },
    { path: '/next', lazy: () => fetched },
  ]);
  vi.useFakeTimers();
  render(<RouterProvider router={router} />);
  act(() => screen.getByRole('button').click());
  return { router, arrive };
}

const wait = (ms: number) => act(() => vi.advanceTimersByTimeAsync(ms));

it('writes what was changed to the address a moment later', async () => {
  const { router } = open();
  await wait(400);
  expect(router.state.location.search).toContain('44');
});

it('does not hold back somebody who leaves before it is written', async () => {
  const { router, arrive } = open();
  act(() => void router.navigate('/next'));
  await wait(400);
  arrive();
  await wait(10);
  expect(router.state.location.pathname).toBe('/next');
  expect(screen.getByText('the next page')).toBeTruthy();
});
