import "react";

declare module "react" {
  interface CSSProperties {
    /** Custom properties that a component hands to its stylesheet. */
    [name: `--${string}`]: string | number | undefined;
  }
}
