/** A formula with its digits below the line: SiO2 reads as it is written by hand. Other text stays as it is. */
export function LayerName({ name }: { name: string }) {
  if (!/^([A-Z][a-z]?\d*){2,}$/.test(name)) return name;
  return name.split(/(\d+)/).map((part, index) =>
    /^\d+$/.test(part) ? (
      <sub key={index} className="text-[0.72em] leading-none">
        {part}
      </sub>
    ) : (
      part
    ),
  );
}
