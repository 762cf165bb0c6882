import type { ActionState } from "@/lib/notify/result";

type Act = (input: unknown) => Promise<ActionState<unknown>>;

/** The server actions of the team page. */
export type TeamActs = {
  /** {email, roles} */ invite: Act;
  /** {userId, roles} */ setRoles: Act;
  /** {userId, status} */ setStatus: Act;
  /** {id} */ withdraw: Act;
};
