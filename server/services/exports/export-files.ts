import { mkdir, readdir, rename, rm } from 'node:fs/promises';
import { join } from 'node:path';

/** The files of exports: each under the id of its job and nothing else, so that no name can lead elsewhere. */
export interface ExportFiles {
  directory: string;
  /** Where a job's file is written until it is complete. */
  unfinished(id: string): string;
  /** Gives a complete file its name. */
  complete(id: string): Promise<void>;
  /** Removes what there is of a job's file. */
  remove(id: string): Promise<void>;
  /** Makes the folder, and removes from it all that belongs to none of these jobs or is incomplete. */
  tidy(ids: ReadonlySet<string>): Promise<void>;
}

const unfinishedEnding = '.unfinished';

export function createExportFiles(directory: string): ExportFiles {
  const unfinished = (id: string): string => join(directory, `${id}${unfinishedEnding}`);
  return {
    directory,
    unfinished,
    complete: (id) => rename(unfinished(id), join(directory, id)),
    async remove(id) {
      await rm(unfinished(id), { force: true });
      await rm(join(directory, id), { force: true });
    },
    async tidy(ids) {
      await mkdir(directory, { recursive: true });
      const strays = (await readdir(directory)).filter((name) => !ids.has(name));
      for (const name of strays) await rm(join(directory, name), { force: true, recursive: true });
    },
  };
}
