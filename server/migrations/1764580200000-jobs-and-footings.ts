import type { MigrationInterface, QueryRunner } from 'typeorm';
import { companyRowsOnly, writtenOnce } from './tenancy-sql';

const UNIT_STYLES = `('feet-inches', 'decimal-feet', 'metric')`;
const SURFACES = `('dig', 'rails', 'wet', 'top')`;
/** Who did it: somebody of the same company, at the time. Memberships stay, so the name stays. */
const BY = (column: string) => `foreign key (company_id, ${column}) references memberships (company_id, person_id)`;

/** Jobs with their rules and benchmarks, the register of instruments, and footings with outline and stations. Lengths: nanometres. */
export class JobsAndFootings1764580200000 implements MigrationInterface {
  readonly name = 'JobsAndFootings1764580200000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table jobs (
        company_id uuid not null references companies,
        id uuid not null,
        name text not null,
        address text not null,
        unit_style text not null check (unit_style in ${UNIT_STYLES}),
        graduation bigint not null check (graduation > 0),
        wall_type text not null check (wall_type in ('block', 'foam-forms', 'panel-forms', 'sill')),
        created_at timestamptz not null,
        created_by uuid not null,
        primary key (company_id, id),
        ${BY('created_by')}
      );
      ${companyRowsOnly('jobs')}
      grant select, insert, update (name, address, unit_style, graduation, wall_type) on jobs to tallyrod_app;

      create table tolerance_rules (
        company_id uuid not null,
        id uuid not null,
        job_id uuid not null,
        surface text not null check (surface in ${SURFACES}),
        version integer not null check (version > 0),
        low bigint not null check (low >= 0),
        high bigint not null check (high >= 0),
        decision text not null check (decision in ('simple', 'guarded')),
        style text not null check (style in ${UNIT_STYLES}),
        created_at timestamptz not null,
        created_by uuid not null,
        primary key (company_id, id),
        unique (company_id, job_id, surface, version),
        foreign key (company_id, job_id) references jobs (company_id, id),
        ${BY('created_by')}
      );
      ${companyRowsOnly('tolerance_rules')}
      ${writtenOnce('tolerance_rules')}
      grant select, insert on tolerance_rules to tallyrod_app;

      create table bed_rules (
        company_id uuid not null,
        id uuid not null,
        job_id uuid not null,
        version integer not null check (version > 0),
        material text not null check (material in ('mortar', 'foam', 'shim')),
        least bigint not null check (least >= 0),
        most bigint not null check (most > 0),
        nominal bigint not null check (nominal >= 0),
        grind_most bigint not null check (grind_most >= 0),
        bedded_fraction double precision not null check (bedded_fraction > 0 and bedded_fraction <= 1),
        course_height bigint check (course_height > 0),
        style text not null check (style in ${UNIT_STYLES}),
        created_at timestamptz not null,
        created_by uuid not null,
        primary key (company_id, id),
        unique (company_id, job_id, version),
        foreign key (company_id, job_id) references jobs (company_id, id),
        ${BY('created_by')}
      );
      ${companyRowsOnly('bed_rules')}
      ${writtenOnce('bed_rules')}
      grant select, insert on bed_rules to tallyrod_app;

      create table benchmarks (
        company_id uuid not null,
        id uuid not null,
        job_id uuid not null,
        primary key (company_id, id),
        foreign key (company_id, job_id) references jobs (company_id, id)
      );
      create index benchmarks_of_job on benchmarks (company_id, job_id);
      ${companyRowsOnly('benchmarks')}
      grant select, insert on benchmarks to tallyrod_app;

      create table benchmark_versions (
        company_id uuid not null,
        benchmark_id uuid not null,
        version integer not null check (version > 0),
        name text not null,
        elevation bigint not null,
        note text not null,
        created_at timestamptz not null,
        created_by uuid not null,
        primary key (company_id, benchmark_id, version),
        foreign key (company_id, benchmark_id) references benchmarks (company_id, id),
        ${BY('created_by')}
      );
      ${companyRowsOnly('benchmark_versions')}
      ${writtenOnce('benchmark_versions')}
      grant select, insert on benchmark_versions to tallyrod_app;

      create table lasers (
        company_id uuid not null references companies,
        id uuid not null,
        name text not null,
        accuracy bigint not null check (accuracy > 0),
        accuracy_at bigint not null check (accuracy_at > 0),
        receiver_fine bigint not null check (receiver_fine > 0),
        receiver_coarse bigint not null check (receiver_coarse > 0),
        checked_on date,
        created_at timestamptz not null,
        primary key (company_id, id),
        unique (company_id, name)
      );
      ${companyRowsOnly('lasers')}
      grant select, insert, update (name, accuracy, accuracy_at, receiver_fine, receiver_coarse, checked_on) on lasers to tallyrod_app;

      create table rods (
        company_id uuid not null references companies,
        id uuid not null,
        name text not null,
        style text not null check (style in ${UNIT_STYLES}),
        graduation bigint not null check (graduation > 0),
        length bigint not null check (length > 0),
        created_at timestamptz not null,
        primary key (company_id, id),
        unique (company_id, name)
      );
      ${companyRowsOnly('rods')}
      grant select, insert, update (name, style, graduation, length) on rods to tallyrod_app;
    `);
    await runner.query(`
      create table footings (
        company_id uuid not null,
        id uuid not null,
        job_id uuid not null,
        name text not null,
        plan_grade bigint not null,
        width bigint not null check (width > 0),
        thickness bigint not null check (thickness > 0),
        wall_thickness bigint not null check (wall_thickness > 0),
        measured_on text not null check (measured_on in ('wall-face', 'footing-face', 'centre-line')),
        rail_offset bigint not null,
        rails text not null check (rails in ('centre', 'both')),
        dig_needed boolean not null,
        landmark_name text,
        landmark_azimuth double precision,
        outline_version integer not null default 0 check (outline_version >= 0),
        spacing bigint check (spacing > 0),
        created_at timestamptz not null,
        created_by uuid not null,
        primary key (company_id, id),
        unique (company_id, job_id, name),
        check ((landmark_name is null) = (landmark_azimuth is null)),
        foreign key (company_id, job_id) references jobs (company_id, id),
        ${BY('created_by')}
      );
      ${companyRowsOnly('footings')}
      grant select, insert, update on footings to tallyrod_app;

      create table runs (
        company_id uuid not null,
        id uuid not null,
        footing_id uuid not null,
        position integer not null check (position >= 0),
        length bigint not null check (length > 0),
        turn double precision not null,
        width bigint check (width > 0),
        thickness bigint check (thickness > 0),
        primary key (company_id, id),
        unique (company_id, footing_id, position) deferrable initially deferred,
        foreign key (company_id, footing_id) references footings (company_id, id)
      );
      ${companyRowsOnly('runs')}
      grant select, insert, update, delete on runs to tallyrod_app;

      create table steps (
        company_id uuid not null,
        id uuid not null,
        run_id uuid not null,
        at bigint not null check (at >= 0),
        by bigint not null,
        primary key (company_id, id),
        foreign key (company_id, run_id) references runs (company_id, id)
      );
      create index steps_of_run on steps (company_id, run_id);
      ${companyRowsOnly('steps')}
      grant select, insert, update, delete on steps to tallyrod_app;

      create table stations (
        company_id uuid not null,
        id uuid not null,
        footing_id uuid not null,
        run_id uuid not null,
        position integer not null check (position >= 0),
        at bigint not null check (at >= 0),
        name text,
        added boolean not null,
        corner text,
        step text check (step in ('before', 'after')),
        plan_grade bigint not null,
        x double precision not null,
        y double precision not null,
        primary key (company_id, id),
        unique (company_id, footing_id, position) deferrable initially deferred,
        foreign key (company_id, footing_id) references footings (company_id, id),
        foreign key (company_id, run_id) references runs (company_id, id)
      );
      ${companyRowsOnly('stations')}
      grant select, insert, update, delete on stations to tallyrod_app;

      create table station_points (
        company_id uuid not null,
        station_id uuid not null,
        rail text not null check (rail in ('centre', 'outer', 'inner')),
        x double precision not null,
        y double precision not null,
        primary key (company_id, station_id, rail),
        foreign key (company_id, station_id) references stations (company_id, id) on delete cascade
      );
      ${companyRowsOnly('station_points')}
      grant select, insert, update, delete on station_points to tallyrod_app;
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of [
      'station_points',
      'stations',
      'steps',
      'runs',
      'footings',
      'rods',
      'lasers',
      'benchmark_versions',
      'benchmarks',
      'bed_rules',
      'tolerance_rules',
      'jobs',
    ]) {
      await runner.query(`drop table ${table}`);
    }
  }
}
