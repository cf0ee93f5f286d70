import { z } from 'zod';

/** A bench that calls, as desks show it until someone acknowledges it. */
export interface EngineerCall {
  id: string;
  stationCode: string;
  stationName: string;
  sinceIso: string;
  operatorNumber: string | null;
  serial: string | null;
}

export const acknowledgeCallSchema = z.object({ callId: z.uuid() });
