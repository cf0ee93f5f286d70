import { measuring, stay, type StepMachine } from '../machine';
import { advancePowerUp, beginPowerUp, type PowerUp, type PowerUpSettings } from '../procedures/power-up';

export const powerUp: StepMachine<PowerUpSettings, PowerUp> = {
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
