import type { Page } from 'playwright-core';
import { button, choose, fill, heading, link } from './fields';

export interface LaserPapers {
  name: string;
  papers: 'Inches and feet' | 'Millimetres and metres';
  accuracy: string;
  at: string;
  fine: string;
  coarse: string;
}

/** Enters a laser, checked today. */
export async function enterLaser(page: Page, laser: LaserPapers): Promise<void> {
  await link(page, /^(Enter the laser|New laser)$/)
    .first()
    .click();
  await heading(page, 'New laser').waitFor();
  await fill(page, 'Name', laser.name);
  await choose(page, 'Its papers are in', laser.papers);
  await fill(page, 'Accuracy, plus or minus', laser.accuracy);
  await fill(page, 'At a distance of', laser.at);
  await fill(page, 'Receiver, fine band', laser.fine);
  await fill(page, 'Receiver, coarse band', laser.coarse);
  await button(page, 'Today').click();
  await button(page, 'Save the laser').click();
  await page.getByRole('heading', { name: 'Lasers', level: 1 }).waitFor();
}

export async function enterRod(
  page: Page,
  rod: { name: string; style: string; graduation: string; length: string },
): Promise<void> {
  await link(page, 'New rod').first().click();
  await heading(page, 'New rod').waitFor();
  await fill(page, 'Name', rod.name);
  await choose(page, 'It is marked in', rod.style);
  await choose(page, 'It is read to', rod.graduation);
  await fill(page, 'Length when run out', rod.length);
  await button(page, 'Save the rod').click();
  await page.getByRole('heading', { name: 'Lasers', level: 1 }).waitFor();
}

export interface JobPapers {
  name: string;
  style: string;
  graduation: string;
  top: { below: string; above: string };
  bed: { least: string; most: string; nominal: string; grindMost: string };
}

/** Enters a job for block on mortar with a tolerance of its own for the top. */
export async function enterJob(page: Page, job: JobPapers): Promise<void> {
  await link(page, 'Jobs').first().click();
  await link(page, 'New job').first().click();
  await page.getByRole('heading', { name: 'New job', level: 1 }).waitFor();
  await fill(page, 'Name', job.name);
  await choose(page, 'Lengths', new RegExp(`^${job.style}`));
  await choose(page, 'Rods are read to', job.graduation);
  await choose(page, 'Wall on the footing', 'Block on mortar');
  await button(page, 'Change the rule of Top').click();
  await fill(page, 'Allowed below', job.top.below);
  await fill(page, 'Allowed above', job.top.above);
  await fill(page, 'Thinnest', job.bed.least);
  await fill(page, 'Thickest', job.bed.most);
  await fill(page, 'Planned', job.bed.nominal);
  await fill(page, 'Most to grind', job.bed.grindMost);
  await button(page, 'Save the job').click();
  await page.getByRole('heading', { name: job.name, level: 1 }).waitFor();
}

export async function addBenchmark(page: Page, benchmark: { name: string; elevation: string }): Promise<void> {
  await link(page, 'Add a benchmark').first().click();
  await page.getByRole('heading', { name: 'New benchmark', level: 1 }).waitFor();
  await fill(page, 'Name', benchmark.name);
  await fill(page, 'Elevation', benchmark.elevation);
  await button(page, 'Add the benchmark').click();
  await heading(page, 'Benchmarks').waitFor();
}

export interface FootingPapers {
  name: string;
  planGrade: string;
  width: string;
  thickness: string;
  wallThickness: string;
  landmark: { name: string; side: 'Ahead' | 'Right' | 'Behind' | 'Left' };
}

/** A footing taped on its centre line, shot in the middle, its dig not shot; its outline comes next. */
export async function addFooting(page: Page, footing: FootingPapers): Promise<void> {
  await link(page, 'New footing').first().click();
  await page.getByRole('heading', { name: 'New footing', level: 1 }).waitFor();
  await fill(page, 'Name', footing.name);
  await fill(page, 'Top of footing', footing.planGrade);
  await fill(page, 'Width', footing.width);
  await fill(page, 'Thickness', footing.thickness);
  await fill(page, 'Thickness of the wall on it', footing.wallThickness);
  await choose(page, 'Lengths are taped on', 'Centre line');
  await choose(page, 'Rod held on', /^The middle/);
  await choose(page, 'The dig', 'Is not shot');
  await fill(page, 'A street or a mark beside it', footing.landmark.name);
  await choose(page, 'It lies', footing.landmark.side);
  await button(page, 'Save the footing').click();
  await page.getByRole('heading', { name: 'Footing outline', level: 1 }).waitFor();
}
