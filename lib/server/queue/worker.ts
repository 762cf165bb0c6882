import type PgBoss from "pg-boss";
import { boss } from "./boss";
import { jobSchemas, type JobData, type JobName } from "./jobs";
import { log, logSurprise } from "../log";
import { giveUpMail, MailNotTaken, relayMail } from "../mail/relay";
import { queues } from "@/db/migrate";
import { buildPack, failPack } from "@/db/queries/pack-build";

/** The work of each queue, and what is done when its last try has failed too. Both may be run more than once. */
type Work<N extends JobName> = {
  run: (data: JobData<N>) => Promise<void>;
  giveUp: (data: JobData<N>, logId: string) => Promise<void>;
};

const works: { [N in JobName]: Work<N> } = {
  "build-pack": {
    run: ({ packId, firmId }) => buildPack(packId, firmId),
    giveUp: ({ packId, firmId }, logId) => failPack(packId, firmId, logId),
  },
  "relay-mail": { run: relayMail, giveUp: giveUpMail },
};

/** One kind at a time in this process: building a pack takes a core and most of the memory. */
const options = { batchSize: 1, pollingIntervalSeconds: 0.5 } as const;

async function attend<N extends JobName>(queue: PgBoss, name: N): Promise<void> {
  const work = works[name];
  const parse = (job: PgBoss.Job<unknown> | undefined) => jobSchemas[name].parse(job?.data) as JobData<N>;
  await queue.work(name, options, async ([job]) => {
    try {
      await work.run(parse(job));
    } catch (error) {
      if (error instanceof MailNotTaken)
        log.warn({ queue: name, job: job?.id, because: error.message }, "mail not taken");
      else logSurprise(error, `queue ${name} job ${job?.id}`);
      throw error;
    }
  });
  await queue.work(queues[name], options, async ([job]) => {
    const logId = logSurprise(new Error("tried for the last time"), `queue ${name} data ${JSON.stringify(job?.data)}`);
    await work.giveUp(parse(job), logId);
  });
}

/** Begin to take work from every queue. `stopBoss` ends it. */
export async function startWorker(): Promise<void> {
  const queue = await boss();
  for (const name of Object.keys(works) as JobName[]) await attend(queue, name);
  log.info("worker started");
}
