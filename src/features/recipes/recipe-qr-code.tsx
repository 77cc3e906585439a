import { useQuery } from "@tanstack/react-query";

/** Leads from the paper back to the recipe. Where its code cannot be loaded, the address beside it must do. */
export function RecipeQrCode({ url }: { url: string }) {
  const { data } = useQuery({
    queryKey: ["qr", url],
    queryFn: async () => (await import("./qr-path.ts")).qrPath(url),
    staleTime: Number.POSITIVE_INFINITY,
  });
  if (!data) return null;
  // Four modules of quiet around it, as ISO/IEC 18004 asks.
  return (
    <svg
      viewBox={`-4 -4 ${data.size + 8} ${data.size + 8}`}
      className="size-28 bg-surface"
      shapeRendering="crispEdges"
      role="img"
      aria-label="QR code of this recipe's address"
    >
      <path d={data.path} className="fill-ink" />
    </svg>
  );
}
