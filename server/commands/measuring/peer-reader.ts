/** The reader that anyone could put together from the system's own commands, to compare with. */
import { spawn } from 'node:child_process';
import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';

export interface PeerUse {
  cpuSeconds: number;
  /** Of the largest process. */
  peakMegabytes: number;
}

interface PeerResult extends PeerUse {
  text: string;
}

/** Runs one command, with its time on the processor and its largest memory. */
async function run(command: string, args: string[]): Promise<{ out: string } & PeerUse> {
  const quoted = [command, ...args].map((part) => `'${part.replaceAll("'", "'\\''")}'`).join(' ');
  const child = spawn('bash', ['-c', `TIMEFORMAT='#%U %S'; time ${quoted}`], {
    env: { ...process.env, OMP_THREAD_LIMIT: '1', LC_ALL: 'C' },
  });
  let peakMegabytes = 0;
  const watch = setInterval(() => {
    void findPeak(child.pid ?? 0).then((peak) => (peakMegabytes = Math.max(peakMegabytes, peak)));
  }, 40);
  let out = '';
  let errors = '';
  child.stdout.on('data', (data: Buffer) => (out += data.toString()));
  child.stderr.on('data', (data: Buffer) => (errors += data.toString()));
  const code = await new Promise<number | null>((resolve) => child.on('close', resolve));
  clearInterval(watch);
  const times = /#([\d.]+) ([\d.]+)\s*$/.exec(errors);
  if (code !== 0 || !times) throw new Error(`${command} did not work: ${errors.slice(0, 300)}`);
  return { out, cpuSeconds: Number(times[1]) + Number(times[2]), peakMegabytes };
}

async function findPeak(shell: number): Promise<number> {
  try {
    const children = await readFile(`/proc/${shell}/task/${shell}/children`, 'utf8');
    const [pid] = children.trim().split(' ');
    const status = await readFile(`/proc/${pid || shell}/status`, 'utf8');
    return Number(/VmHWM:\s+(\d+)/.exec(status)?.[1] ?? 0) / 1024;
  } catch {
    return 0;
  }
}

/** Text of a file's pages: a PDF is drawn in grey first, one command for each page afterwards. */
async function readFileByPeer(file: string, dpi: number, folder: string): Promise<PeerResult[]> {
  if (!file.toLowerCase().endsWith('.pdf')) return [await recognise(file)];
  const prefix = path.join(folder, `${path.basename(file)}-page`);
  const drawn = await run('pdftoppm', ['-r', String(dpi), '-gray', file, prefix]);
  const pages = (await readdir(folder))
    .filter((name) => name.startsWith(path.basename(prefix)))
    .sort();
  const results: PeerResult[] = [];
  for (const page of pages) results.push(await recognise(path.join(folder, page)));
  const [first] = results;
  if (first) first.cpuSeconds += drawn.cpuSeconds;
  return results;
}

async function recognise(picture: string): Promise<PeerResult> {
  const { out, cpuSeconds, peakMegabytes } = await run('tesseract', [picture, '-', '-l', 'eng']);
  return { text: out, cpuSeconds, peakMegabytes };
}

/** Reads all files with two commands at a time; text by file, and what it took. */
export async function readByPeer(
  files: readonly string[],
  dpi: number,
): Promise<{ texts: Map<string, string>; use: PeerUse }> {
  const folder = await mkdtemp(path.join(tmpdir(), 'peer-'));
  const texts = new Map<string, string>();
  const use: PeerUse = { cpuSeconds: 0, peakMegabytes: 0 };
  const queue = [...files];
  const work = async () => {
    for (let file = queue.shift(); file !== undefined; file = queue.shift()) {
      const pages = await readFileByPeer(file, dpi, folder);
      texts.set(file, pages.map((page) => page.text).join('\n'));
      for (const page of pages) {
        use.cpuSeconds += page.cpuSeconds;
        use.peakMegabytes = Math.max(use.peakMegabytes, page.peakMegabytes);
      }
    }
  };
  try {
    await Promise.all([work(), work()]);
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
  return { texts, use };
}
