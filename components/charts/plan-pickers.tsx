import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Pressable, StyleSheet } from 'react-native';
import { pressedAt } from './pressed-at';
import type { PlanPlace, PlanStation } from './chart-types';
import { nearestSpot, type PlanFit, type Spot } from './plan-geometry';

interface KeyEvent {
  key: string;
  shiftKey?: boolean;
  preventDefault(): void;
}

interface StationPickerProps {
  stations: readonly PlanStation[];
  fit: PlanFit;
  onPick: (id: string) => void;
  /** Where the keys are, to be drawn; null when they have left. */
  onMove: (spot: Spot | null) => void;
}

/** Lies over a plan: a press picks the nearest station, arrow keys walk from one to the next and Enter picks. */
export function StationPicker({ stations, fit, onPick, onMove }: StationPickerProps) {
  const { t } = useTranslation('charts');
  const [at, setAt] = useState(0);
  const station = stations[Math.min(at, stations.length - 1)];
  const walk = (to: number) => {
    const next = (to + stations.length) % stations.length;
    setAt(next);
    const found = stations[next];
    if (found) onMove(fit.toSpot(found));
  };
  // The web's own attributes and events, which react-native's types do not know.
  const web = {
    onKeyDown: (event: KeyEvent) => {
      const step = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }[event.key];
      if (step !== undefined) walk(at + step);
      else if (event.key === 'Home') walk(0);
      else if (event.key === 'End') walk(stations.length - 1);
      else if ((event.key === 'Enter' || event.key === ' ') && station) onPick(station.id);
      else return;
      event.preventDefault();
    },
    'aria-roledescription': t('plan.pickStationHow'),
  };
  if (!station) return null;
  return (
    <Pressable
      {...web}
      role="slider"
      aria-label={t('plan.pickStation')}
      aria-valuemin={1}
      aria-valuemax={stations.length}
      aria-valuenow={at + 1}
      aria-valuetext={station.label}
      onFocus={() => onMove(fit.toSpot(station))}
      onBlur={() => onMove(null)}
      onPress={(event) => {
        const spot = pressedAt(event);
        const found = spot && nearestSpot(stations, fit.toSpot, spot, 40);
        if (found) onPick(found.id);
      }}
      style={StyleSheet.absoluteFill}
    />
  );
}

interface PlacePickerProps {
  start: PlanPlace | null | undefined;
  size: { width: number; height: number };
  fit: PlanFit;
  onPick: (place: PlanPlace) => void;
  onMove: (spot: Spot | null) => void;
  placeText: ((place: PlanPlace) => string) | undefined;
}

/** Lies over a plan: a press picks the place under it, arrow keys move a cross and Enter picks. */
export function PlacePicker({ start, size, fit, onPick, onMove, placeText }: PlacePickerProps) {
  const { t } = useTranslation('charts');
  const [moved, setMoved] = useState<Spot | null>(null);
  const spot = moved ?? (start ? fit.toSpot(start) : { x: size.width / 2, y: size.height / 2 });
  const pick = (to: Spot) => {
    const { x, y } = fit.toPlace(to);
    setMoved(null);
    onPick({ x: Math.round(x), y: Math.round(y) });
  };
  const web = {
    onKeyDown: (event: KeyEvent) => {
      const step = event.shiftKey ? 2 : 12;
      const way = { ArrowRight: [step, 0], ArrowLeft: [-step, 0], ArrowUp: [0, -step], ArrowDown: [0, step] }[event.key];
      if (way) {
        const to = {
          x: Math.min(Math.max(spot.x + (way[0] ?? 0), 0), size.width),
          y: Math.min(Math.max(spot.y + (way[1] ?? 0), 0), size.height),
        };
        setMoved(to);
        onMove(to);
      } else if (event.key === 'Enter' || event.key === ' ') pick(spot);
      else return;
      event.preventDefault();
    },
    'aria-roledescription': t('plan.pickPlaceHow'),
  };
  return (
    <Pressable
      {...web}
      role="slider"
      aria-label={t('plan.pickPlace')}
      aria-valuemin={0}
      aria-valuemax={Math.round(size.width)}
      aria-valuenow={Math.round(spot.x)}
      aria-valuetext={placeText?.(fit.toPlace(spot))}
      onFocus={() => onMove(spot)}
      onBlur={() => {
        setMoved(null);
        onMove(null);
      }}
      onPress={(event) => {
        const pressed = pressedAt(event);
        if (pressed) pick(pressed);
      }}
      style={StyleSheet.absoluteFill}
    />
  );
}
