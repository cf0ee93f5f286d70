import type { Metadata } from 'next';
import { BenchClient } from '@/components/bench/bench-client';
import { authoriseBench } from '@/server/auth/authorise';

interface Props {
  params: Promise<{ station: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Bench ${decodeURIComponent((await params).station)}` };
}

/** The screen of one station. Everything on it comes over the live connection. */
export default async function BenchPage({ params }: Props) {
  const station = decodeURIComponent((await params).station);
  await authoriseBench(station);
  return <BenchClient station={station} />;
}
