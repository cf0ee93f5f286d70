import type { Metadata } from 'next';
import { Entrance } from '@/components/people/entrance';
import { Button, ButtonLink } from '@/components/ui/button';
import { currentActor, currentEnrolment } from '@/server/auth/authorise';
import { listBenchDoors } from '@/server/operations/bench/list-bench-doors';
import { standAtDemoBench } from './actions';

export const metadata: Metadata = { title: 'Bench' };

/** The door to the benches: a browser that stands at one opens it; in the demo, any browser may stand at a simulated one. */
export default async function BenchDoorPage() {
  const [actor, enrolment] = await Promise.all([currentActor(), currentEnrolment()]);
  const doors = await listBenchDoors({ signedIn: actor !== null, enrolledAt: enrolment?.stationCode ?? null });
  return (
    <Entrance
      title={doors.length > 0 ? 'Open a bench' : 'This browser is at no bench'}
      foot={
        actor ? null : (
          <ButtonLink kind="link" href="/sign-in">
            Sign in at a desk instead
          </ButtonLink>
        )
      }
    >
      {doors.length === 0 ? (
        <p>
          An administrator signs in here and makes this browser the screen of a station, under Administration, Stations.
          After that the badge and PIN open it.
        </p>
      ) : (
        <ul className="grid gap-5">
          {doors.map((door) => (
            <li key={door.code} className="grid gap-2 border-t border-hair pt-4">
              <p>
                <strong>{door.name}</strong>, {door.fixture}
                {door.simulated ? ', simulated' : ''}
              </p>
              {door.way === 'stand' ? (
                <form action={standAtDemoBench.bind(null, door.code)}>
                  <Button kind="filled" type="submit">
                    Stand at {door.name}
                  </Button>
                </form>
              ) : (
                <div>
                  <ButtonLink kind={door.way === 'open' ? 'filled' : 'outlined'} href={`/bench/${door.code}`}>
                    {door.way === 'open' ? `Open ${door.name}` : `Watch ${door.name}`}
                  </ButtonLink>
                </div>
              )}
            </li>
          ))}
        </ul>
      )}
    </Entrance>
  );
}
