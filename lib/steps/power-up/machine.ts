import { measuring, stay, type StepMachine } from '../../run/machine';
import { advancePowerUp, beginPowerUp, type PowerUp } from '../../run/procedures/power-up';
import type { PowerUpStep } from './schema';

export const machine: StepMachine<PowerUpStep, PowerUp> = {
  begin: (step) => beginPowerUp(step),

  advance(machine, event, _step, context) {
    const turn = 'id' in event ? advancePowerUp(machine, event, context) : null;
    if (!turn) return stay(machine);
    if ('ask' in turn) return turn;
    const { ending, measurements } = turn.result;
    return ending ? { ending, measurements } : { done: true, measurements };
  },

  view: () => measuring({ code: 'run.power-up' }),
};
