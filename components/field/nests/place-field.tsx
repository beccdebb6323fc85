'use client';

import { type ReactElement, useState } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
import type { Place } from '@/lib/offline/nest-view';

interface PlaceFieldProps {
  place: Place | null;
  onChange: (place: Place | null) => void;
}

/** Longest wait for a fix: without signal a phone needs its time, but it must not drain the battery. */
const FIX_TIMEOUT_MS = 60_000;

/** Asks the phone once where it is; it stops looking after the first fix. */
function askPlace(): Promise<Place> {
  return new Promise((resolve, reject) => {
    if (!('geolocation' in navigator)) return reject(new Error('no geolocation'));
    navigator.geolocation.getCurrentPosition(
      ({ coords }) => resolve({ lat: coords.latitude, lon: coords.longitude, accuracyM: Math.round(coords.accuracy) }),
      reject,
      { enableHighAccuracy: true, timeout: FIX_TIMEOUT_MS, maximumAge: 0 },
    );
  });
}

/** A place in words: `43.59800, −77.60500, within 12 m`. */
function placeWords({ lat, lon, accuracyM }: Place): string {
  const within = accuracyM === null ? '' : `, within ${accuracyM} m`;
  return `${lat.toFixed(5)}, ${lon.toFixed(5)}${within}`.replaceAll('-', '−');
}

/** The nest's place, taken from the phone by one press. Works without signal, slowly. */
export function PlaceField({ place, onChange }: PlaceFieldProps): ReactElement {
  const [state, setState] = useState<'idle' | 'looking' | 'failed'>('idle');
  const look = async (): Promise<void> => {
    setState('looking');
    try {
      onChange(await askPlace());
      setState('idle');
    } catch {
      setState('failed');
    }
  };
  return (
    <div role="group" aria-labelledby="nest-place" className="flex flex-col gap-2">
      <p id="nest-place" className="font-bold">
        Place
      </p>
      <p role="status" className="text-quiet">
        {state === 'looking' && 'Looking for the place. This can take a minute without signal.'}
        {state === 'failed' && 'The phone could not tell where it is. Go on without; the place can wait.'}
        {state === 'idle' && (place ? placeWords(place) : 'Can wait. Stand near the nest.')}
      </p>
      <div className="flex flex-wrap gap-gap">
        <FieldButton onClick={() => void look()} disabled={state === 'looking'}>
          {place ? 'Take the place again' : 'Take the place from this phone'}
        </FieldButton>
        {place && (
          <FieldButton tone="quiet" onClick={() => onChange(null)}>
            No place
          </FieldButton>
        )}
      </div>
    </div>
  );
}
