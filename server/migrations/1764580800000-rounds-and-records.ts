import type { MigrationInterface, QueryRunner } from 'typeorm';
import { companyRowsOnly, writtenOnce } from './tenancy-sql';

/**
 * Rounds and what is written in the field. A record is one row of `records` (who, when, in which order) and one of its kind's
 * own table. Records point at one another by id alone, never by foreign key: a strike may come before what it strikes.
 * `ordered_at`, `clock_wall` and `clock_skew` are milliseconds; lengths are nanometres.
 */
export class RoundsAndRecords1764580800000 implements MigrationInterface {
  readonly name = 'RoundsAndRecords1764580800000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table devices (
        company_id uuid not null references companies,
        id uuid not null,
        first_seen_at timestamptz not null,
        first_person_id uuid not null,
        primary key (company_id, id),
        foreign key (company_id, first_person_id) references memberships (company_id, person_id)
      );
      ${companyRowsOnly('devices')}
      -- The right to update is for the row lock under which a phone's records are laid in order.
      grant select, insert, update on devices to tallyrod_app;

      create table rounds (
        company_id uuid not null,
        id uuid not null,
        footing_id uuid not null,
        surface text not null check (surface in ('dig', 'rails', 'wet', 'top')),
        number integer not null check (number > 0),
        opened_at timestamptz not null,
        opened_by uuid not null,
        closed_at timestamptz,
        tolerance_rule_id uuid not null,
        bed_rule_id uuid not null,
        last_sequence integer not null default 0 check (last_sequence >= 0),
        primary key (company_id, id),
        unique (company_id, footing_id, surface, number),
        foreign key (company_id, footing_id) references footings (company_id, id),
        foreign key (company_id, opened_by) references memberships (company_id, person_id),
        foreign key (company_id, tolerance_rule_id) references tolerance_rules (company_id, id),
        foreign key (company_id, bed_rule_id) references bed_rules (company_id, id)
      );
      ${companyRowsOnly('rounds')}
      grant select, insert, update (closed_at, last_sequence) on rounds to tallyrod_app;

      create table records (
        company_id uuid not null,
        id uuid not null,
        round_id uuid not null,
        kind text check (kind in ('setup', 'series', 'reading', 'strike')),
        device_id uuid not null,
        device_sequence bigint not null check (device_sequence > 0),
        clock_wall bigint,
        clock_counter integer,
        made_at timestamptz,
        received_at timestamptz not null,
        ordered_at bigint not null check (ordered_at >= 0),
        clock_skew bigint not null,
        person_id uuid not null,
        round_sequence integer check (round_sequence > 0),
        content_hash text not null check (length(content_hash) = 64),
        refusal text,
        refused_content text,
        primary key (company_id, id),
        unique (company_id, device_id, device_sequence),
        unique (company_id, round_id, round_sequence),
        -- Either a record in the round's order, or a refused one: its place among the phone's records and what it said, no more.
        check (
          case when refusal is null
            then kind is not null and clock_wall is not null and clock_counter is not null and made_at is not null
              and round_sequence is not null and refused_content is null
            else round_sequence is null and refused_content is not null
          end),
        foreign key (company_id, round_id) references rounds (company_id, id),
        foreign key (company_id, device_id) references devices (company_id, id),
        foreign key (company_id, person_id) references memberships (company_id, person_id)
      );
      ${companyRowsOnly('records')}
      ${writtenOnce('records')}
      grant select, insert on records to tallyrod_app;
    `);
    await runner.query(`
      create table setups (
        company_id uuid not null,
        record_id uuid not null,
        laser_id uuid not null,
        stand_x double precision,
        stand_y double precision,
        primary key (company_id, record_id),
        check ((stand_x is null) = (stand_y is null)),
        foreign key (company_id, record_id) references records (company_id, id),
        foreign key (company_id, laser_id) references lasers (company_id, id)
      );
      create table series (
        company_id uuid not null,
        record_id uuid not null,
        setup_id uuid not null,
        rod_id uuid not null,
        check_limit bigint not null check (check_limit >= 0),
        benchmark_distance bigint check (benchmark_distance >= 0),
        primary key (company_id, record_id),
        foreign key (company_id, record_id) references records (company_id, id),
        foreign key (company_id, rod_id) references rods (company_id, id)
      );
      create table shots (
        company_id uuid not null,
        record_id uuid not null,
        series_id uuid not null,
        purpose text not null check (purpose in ('backsight', 'shot', 'check', 'foresight')),
        point_kind text not null check (point_kind in ('station', 'benchmark', 'turning')),
        station_id uuid,
        rail text check (rail in ('centre', 'outer', 'inner')),
        benchmark_id uuid,
        turning_name text,
        how text not null check (how in ('read', 'set')),
        receiver text check (receiver in ('fine', 'coarse')),
        keyed text not null check (how = 'read' or keyed = ''),
        style text not null check (style in ('feet-inches', 'decimal-feet', 'metric')),
        reading bigint not null,
        lap integer not null check (lap > 0),
        primary key (company_id, record_id),
        check ((point_kind = 'station') = (station_id is not null) and (station_id is null) = (rail is null)),
        check ((point_kind = 'benchmark') = (benchmark_id is not null)),
        check ((point_kind = 'turning') = (turning_name is not null)),
        foreign key (company_id, record_id) references records (company_id, id),
        foreign key (company_id, station_id) references stations (company_id, id),
        foreign key (company_id, benchmark_id) references benchmarks (company_id, id)
      );
      create index shots_at_station on shots (company_id, station_id);
      create table strikes (
        company_id uuid not null,
        record_id uuid not null,
        target_id uuid not null,
        reason text not null check (reason in ('misread', 'wrong-station', 'rod-not-plumb', 'laser-bumped', 'other')),
        words text not null,
        primary key (company_id, record_id),
        foreign key (company_id, record_id) references records (company_id, id)
      );
      create index strikes_of_target on strikes (company_id, target_id);
      ${['setups', 'series', 'shots', 'strikes'].map((table) => `${companyRowsOnly(table)} ${writtenOnce(table)}`).join('\n')}
      grant select, insert on setups, series, shots, strikes to tallyrod_app;
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of ['strikes', 'shots', 'series', 'setups', 'records', 'rounds', 'devices']) {
      await runner.query(`drop table ${table}`);
    }
  }
}
