import { Group, Scale, Shape } from "@visx/visx";
import { type KeyboardEvent, useId, useRef, useState } from "react";
import { Link } from "react-router-dom";
import { bandNominalMm } from "#shared/peers/peer-group.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { PunchMarkShape } from "../../ui/punch-mark.tsx";
import { useWidth } from "../../ui/use-width.ts";
import { depths } from "./map-depth.ts";
import { type MapLayout, type MapSquare, neighbour } from "./map-layout.ts";
import { bandRange } from "./peer-words.ts";
import { squareName } from "./square-words.ts";

/** Measures in px. */
const head = 44;
const rowHeight = 46;
const leastColumn = 44;
const mostColumn = 168;
const side = { metric: 88, inch: 104 };

export interface PeerMapProps {
  layout: MapLayout;
  label: string;
  units: UnitSystem;
}

/**
 * Thickness bands down, nozzles across; a square is as deep as the band of shops behind it. A grid to the keyboard: one
 * stop for Tab, arrows from square to square.
 */
export function PeerMap({ layout, label, units }: PeerMapProps) {
  const [box, room] = useWidth<HTMLDivElement>(560);
  const hatch = useId();
  const [active, setActive] = useState({ row: 0, column: 0 });
  const grid = useRef<SVGSVGElement>(null);

  const { nozzles, bands, rows } = layout;
  const left = side[units];
  const fitted = (room - left) / nozzles.length;
  const right = left + nozzles.length * Math.max(leastColumn, Math.min(mostColumn, fitted));
  const bottom = head + bands.length * rowHeight;
  const x = Scale.scaleBand({ domain: nozzles, range: [left, right] });
  const y = Scale.scaleBand({ domain: bands, range: [head, bottom] });
  const frame = { width: x.bandwidth(), height: y.bandwidth() };

  function onKeyDown(event: KeyboardEvent) {
    const to = neighbour(layout, active, event.key);
    if (!to) return;
    event.preventDefault();
    setActive(to);
    grid.current?.querySelector<SVGAElement>(`[data-square="${to.row}-${to.column}"]`)?.focus();
  }

  return (
    <div ref={box} className="overflow-x-auto" data-keep-colour="">
      {/* A grid by role, because a table element cannot hold a drawing; the table in words stands below the map. */}
      <svg
        ref={grid}
        role="grid"
        aria-label={label}
        width={right}
        height={bottom + 2}
        className="block"
        onKeyDown={onKeyDown}
      >
        <defs>
          <Hatch id={hatch} />
        </defs>
        <Heads nozzles={nozzles} left={left} x={(nozzle) => x(nozzle)! + frame.width / 2} />
        {rows.map((squares, row) => (
          <Group.Group key={bands[row]} role="row" top={y(bands[row]!)!}>
            <BandHead bandIndex={bands[row]!} units={units} />
            {squares.map((square, column) => (
              <Group.Group key={square.groupId} role="gridcell" left={x(square.key.nozzleMm)!}>
                <Square
                  square={square}
                  frame={frame}
                  hatch={hatch}
                  place={`${row}-${column}`}
                  reached={row === active.row && column === active.column}
                  onFocus={() => setActive({ row, column })}
                />
              </Group.Group>
            ))}
          </Group.Group>
        ))}
      </svg>
    </div>
  );
}

function Hatch({ id }: { id: string }) {
  return (
    <pattern id={id} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      <rect width="1" height="7" className="fill-line-strong opacity-60" />
    </pattern>
  );
}

function Heads({ nozzles, left, x }: { nozzles: readonly number[]; left: number; x: (nozzle: number) => number }) {
  return (
    <Group.Group role="row">
      <Group.Group role="columnheader" aria-label="Thickness band">
        <text y={16} className="fill-muted text-sm">
          Thickness
        </text>
        <text y={34} className="fill-muted text-sm">
          band
        </text>
        <text x={left} y={16} className="fill-muted text-sm">
          Nozzle, mm
        </text>
      </Group.Group>
      {nozzles.map((nozzle) => (
        <Group.Group key={nozzle} role="columnheader" aria-label={`${nozzle.toFixed(1)} mm nozzle`}>
          <text x={x(nozzle)} y={36} textAnchor="middle" className="figures fill-ink font-bold">
            {nozzle.toFixed(1)}
          </text>
        </Group.Group>
      ))}
    </Group.Group>
  );
}

function BandHead({ bandIndex, units }: { bandIndex: number; units: UnitSystem }) {
  return (
    <Group.Group role="rowheader" aria-label={`${bandNominalMm(bandIndex)} band, ${bandRange(bandIndex, units)}`}>
      <text y={19} className="figures fill-ink font-bold">
        {bandNominalMm(bandIndex)}
      </text>
      <text y={36} className="figures fill-muted text-sm">
        {bandRange(bandIndex, units).replace(" to ", "–").replace(/ \w+$/, "")}
      </text>
    </Group.Group>
  );
}

interface SquareProps {
  square: MapSquare;
  frame: { width: number; height: number };
  hatch: string;
  place: string;
  /** The one square that Tab stops at. */
  reached: boolean;
  onFocus: () => void;
}

function Square({ square, frame, hatch, place, reached, onFocus }: SquareProps) {
  const { figures, groupId, own } = square;
  const depth = figures.status === "released" ? depths[figures.shops] : null;
  const inner = { x: 1, y: 1, width: frame.width - 2, height: frame.height - 2 };
  return (
    <>
      <Link
        to={`/peers/${groupId}`}
        aria-label={squareName(square)}
        data-square={place}
        tabIndex={reached ? 0 : -1}
        onFocus={onFocus}
        className="group outline-none"
      >
        <Shape.Bar {...inner} className="fill-surface" />
        {depth ? (
          <Shape.Bar {...inner} className="fill-ink" opacity={depth.opacity} />
        ) : (
          <Shape.Bar {...inner} fill={`url(#${hatch})`} className="stroke-line" />
        )}
        {own > 0 ? <PunchMarkShape x={frame.width - 12} y={12} radius={6} /> : null}
        <Shape.Bar
          {...inner}
          fill="none"
          strokeWidth={3}
          className="stroke-transparent group-hover:stroke-action group-focus-visible:stroke-action"
        />
      </Link>
      {/* Beside the link, whose name says it in words: inside, it would be a second name. */}
      {figures.status === "released" && depth ? (
        <Group.Group aria-hidden="true" className="pointer-events-none">
          <text
            x={frame.width / 2}
            y={frame.height / 2 + 9}
            textAnchor="middle"
            className={`figures text-sm ${depth.figure}`}
          >
            {figures.shops.replace("-", "–")}
          </text>
        </Group.Group>
      ) : null}
    </>
  );
}
