/**
 * Sets up the demo: a practice with two households whose papers tell a story. The papers go in through the
 * application's own door and are read by the real reader.
 */
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { demoPassword, hashPassword } from '../../auth/passwords.ts';
import { endpoints } from '../../contract/endpoints.ts';
import type { PageReader } from '../../reading/page-reader.ts';
import { type ReadScanDeps, readScan } from '../../use-cases/reading/read-scan.ts';
import { type DemoBox, type DemoHousehold, describeDemoHouseholds } from './demo-households.ts';
import {
  addDemoMembers,
  addDemoPeople,
  demoEmails,
  type DemoPeople,
} from '../../db/seeds/demo-people.ts';
import { type HttpVisitor, signInOverHttp } from './http-visitor.ts';

const paperFolder = path.resolve(import.meta.dirname, '../../../tests/fixtures/demo');
/** Within the usual 270 days of notice for a passport. */
const passportDays = 200;

export interface DemoTools {
  /** Where the application listens. */
  address: string;
  reader: PageReader;
  deps: Omit<ReadScanDeps, 'reader'>;
  today: string;
  say(line: string): void;
}

export async function seedDemo(tools: DemoTools): Promise<void> {
  const people = await addDemoPeople(tools.today, await hashPassword(demoPassword));
  const owner = await signInOverHttp(tools.address, {
    email: demoEmails.owner,
    password: demoPassword,
  });
  for (const demo of describeDemoHouseholds(addDays(tools.today, passportDays))) {
    tools.say(`Reading the papers of the demo household ${demo.household.name} …`);
    await seedHousehold(demo, people, owner, tools);
  }
}

async function seedHousehold(
  demo: DemoHousehold,
  people: DemoPeople,
  owner: HttpVisitor,
  tools: DemoTools,
): Promise<void> {
  const household = await owner.call(endpoints.createHousehold, { body: demo.household });
  await addDemoMembers(people, household.id, demo.roles, tools.today);
  for (const filing of demo.filings) {
    await owner.call(endpoints.putFiling, {
      params: { id: household.id },
      body: { country: demo.household.country, filedOn: null, ...filing },
    });
  }
  const areas = new Map<string, string>();
  for (const box of demo.boxes) {
    if (!areas.has(box.area)) {
      const area = await owner.call(endpoints.createArea, {
        params: { id: household.id },
        body: { name: box.area },
      });
      areas.set(box.area, area.id);
    }
    const made = await owner.call(endpoints.createBox, {
      params: { id: household.id },
      body: { label: box.label, areaId: areas.get(box.area) ?? null },
    });
    await seedBox(
      box,
      { id: made.id, householdId: household.id, folder: demo.folder },
      owner,
      tools,
    );
  }
  for (const { paper, decision } of demo.entered) {
    const made = await owner.call(endpoints.enterPaper, {
      params: { id: household.id },
      body: paper,
    });
    if (!decision) continue;
    await owner.call(endpoints.updatePaper, {
      params: { id: made.id },
      body: decision,
      version: made.version,
    });
  }
}

async function seedBox(
  box: DemoBox,
  place: { id: string; householdId: string; folder: string },
  owner: HttpVisitor,
  { reader, deps }: DemoTools,
): Promise<void> {
  const load = async (name: string) => ({
    name,
    bytes: new Uint8Array(await readFile(path.join(paperFolder, place.folder, name))),
  });
  for (const demoPaper of box.papers) {
    const [scanId] = await owner.upload(place.id, [await load(demoPaper.file)]);
    await readScan(scanId ?? '', { ...deps, reader });
    const { items } = await owner.call(endpoints.listPapers, {
      params: { id: place.householdId },
      query: { box: place.id, sort: '-number', pageSize: '1' },
    });
    const row = items[0];
    if (!row) continue;
    if (demoPaper.decision) {
      await owner.call(endpoints.updatePaper, {
        params: { id: row.id },
        body: demoPaper.decision,
        version: row.version,
      });
    }
    if (demoPaper.hold) {
      await owner.call(endpoints.placeHold, {
        params: { id: place.householdId },
        body: { ...demoPaper.hold, paperId: row.id },
      });
    }
  }
  for (const pile of box.piles) await owner.upload(place.id, [await load(pile)]);
}

function addDays(day: string, days: number): string {
  return new Date(Date.parse(day) + days * 86_400_000).toISOString().slice(0, 10);
}
