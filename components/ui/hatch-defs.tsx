const copper = "M-1 11 11-1M-1 1 1-1M9 11l2-2M1.3 3.7l2.4-2.4M6.3 8.7l2.4-2.4";
const brassLines = "M-1-1 11 11M9-1l2 2M-1 9l2 2";
const alu = "M-1 11 11-1M-1 1 1-1M9 11l2-2M1 1l3 3M6 6l3 3";
const lead = "M-1 8 8-1M-1-1 8 8M-1 1 1-1M6 8l2-2M6-1l2 2M-1 6l2 2";
const iron = "M-1 11 11-1M-1 1 1-1M9 11l2-2M-1 4 4-1M2 11l9-9";

/** The hatch patterns that SVG charts fill with, such as `url(#h-copper)`. Stands once, in the root layout. */
export function HatchDefs() {
  return (
    <svg className="vh" aria-hidden="true" width="0" height="0" focusable="false">
      <defs>
        <pattern id="h-copper" width="10" height="10" patternUnits="userSpaceOnUse">
          <path d={copper} fill="none" stroke="var(--f-copper)" strokeWidth="1.15" />
        </pattern>
        <pattern id="h-wire" width="8" height="8" patternUnits="userSpaceOnUse">
          <path d="M0 2h8" stroke="var(--f-wire)" strokeWidth="2.4" />
          <path d="M0 6h8" stroke="var(--f-wire)" strokeWidth=".9" />
        </pattern>
        <pattern id="h-brass" width="10" height="10" patternUnits="userSpaceOnUse">
          <path d={brassLines} fill="none" stroke="var(--f-brass)" strokeWidth="1.15" />
          <path d="M6.8 1.8l1.4 1.4M1.8 6.8l1.4 1.4" stroke="var(--f-brass)" strokeWidth="1.5" />
        </pattern>
        <pattern id="h-alu" width="10" height="10" patternUnits="userSpaceOnUse">
          <path d={alu} fill="none" stroke="var(--f-alu)" strokeWidth="1" />
        </pattern>
        <pattern id="h-lead" width="7" height="7" patternUnits="userSpaceOnUse">
          <path d={lead} fill="none" stroke="var(--f-lead)" strokeWidth=".95" />
        </pattern>
        <pattern id="h-elec" width="8" height="8" patternUnits="userSpaceOnUse">
          <path d="M0 4h8M4 0v8" stroke="var(--f-elec)" strokeWidth=".9" />
          <path d="M2.6 2.6h2.8v2.8H2.6z" fill="var(--f-elec)" />
        </pattern>
        <pattern id="h-iron" width="10" height="10" patternUnits="userSpaceOnUse">
          <path d={iron} fill="none" stroke="var(--f-iron)" strokeWidth="1.1" />
        </pattern>
        <pattern id="h-cost" width="6" height="6" patternUnits="userSpaceOnUse">
          <path d="M0 3h6" stroke="var(--ink-3)" strokeWidth="1" />
        </pattern>
        <pattern id="h-waste" width="8" height="8" patternUnits="userSpaceOnUse">
          <circle cx="2" cy="2" r=".9" fill="var(--ink-3)" />
          <circle cx="6" cy="6" r=".9" fill="var(--ink-3)" />
        </pattern>
      </defs>
    </svg>
  );
}
