import { materialLabels } from "#shared/materials/materials.ts";
import { bandNominalMm } from "#shared/peers/peer-group.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { TextLink } from "../../ui/text-link.tsx";
import type { MapLayout, MapSquare } from "./map-layout.ts";
import { bandRange, sizesInBand } from "./peer-words.ts";
import { ownWords, squareFact } from "./square-words.ts";

/** The map in words, for whoever reads tables better: only squares with figures or with an own recipe. */
export function MapTable({ layout, units }: { layout: MapLayout; units: UnitSystem }) {
  const rows = layout.rows.flat().filter(({ figures, own }) => figures.status === "released" || own > 0);
  if (rows.length === 0) return <p className="mt-2 text-soft">Nothing to list: no group is shown here yet.</p>;
  return (
    <div className="mt-2 overflow-x-auto">
      <table
        className="w-full text-left"
        aria-label={`Peer groups of ${materialLabels[rows[0]!.key.material].toLowerCase()}`}
      >
        <thead className="text-sm">
          <tr>
            {["Group", "Sizes that meet", "Shops", "Yours"].map((head) => (
              <th key={head} scope="col" className="border-b border-line py-2 pr-4 font-bold">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((square) => (
            <Row key={square.groupId} square={square} units={units} />
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Row({ square, units }: { square: MapSquare; units: UnitSystem }) {
  const { bandIndex, material, nozzleMm } = square.key;
  return (
    <tr>
      <th scope="row" className="border-b border-line py-2 pr-4 font-normal">
        <TextLink to={`/peers/${square.groupId}`}>
          {bandNominalMm(bandIndex)} band, {nozzleMm.toFixed(1)} mm nozzle
        </TextLink>
      </th>
      <td className="border-b border-line py-2 pr-4 text-soft">
        {sizesInBand(bandIndex, material).join(", ") || bandRange(bandIndex, units)}
      </td>
      <td className="border-b border-line py-2 pr-4">{squareFact(square)}</td>
      <td className="border-b border-line py-2">{square.own > 0 ? ownWords(square.own) : "–"}</td>
    </tr>
  );
}
