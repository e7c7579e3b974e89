"use client";

import { Select } from "@/components/ui/select";
import { useKnownZones } from "./use-zone";

interface ZoneSelectProps {
  readonly name: string;
  readonly value: string;
  readonly onChange: (zone: string) => void;
}

const spoken = (zone: string): string => zone.replaceAll("_", " ");

/** All time zones the browser knows, and the chosen one even if it does not. */
export function ZoneSelect({ name, value, onChange }: ZoneSelectProps) {
  const known = useKnownZones();
  const zones = known.includes(value) ? known : [value, ...known];
  return (
    <Select name={name} value={value} onChange={(event) => onChange(event.target.value)}>
      {zones.map((zone) => (
        <option key={zone} value={zone}>
          {spoken(zone)}
        </option>
      ))}
    </Select>
  );
}
