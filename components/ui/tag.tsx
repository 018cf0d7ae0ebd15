import Link from "next/link";
import type { ButtonHTMLAttributes, InputHTMLAttributes, Ref } from "react";
import { classes, without } from "./classes";
import { hatchClass } from "./families";

interface TagFace {
  /** The grade's family, which gives the hatch. */
  family: string;
  /** The grade's name; two grades of one family are told apart by it. */
  name: string;
  /** `lg` is the 48 px picker tag. */
  size?: "md" | "lg";
  className?: string;
}

type TagProps = TagFace &
  (
    | { as?: "span" }
    | { as: "link"; href: string }
    | ({ as: "button"; pressed: boolean } & Omit<ButtonHTMLAttributes<HTMLButtonElement>, "name" | "className">)
    | ({ as: "radio"; field: string; ref?: Ref<HTMLInputElement> } & Omit<InputHTMLAttributes<HTMLInputElement>, "name" | "size" | "className" | "type">)
  );

/** A grade as the tag that hangs on its bin: a label, a link, a pressable choice, or one radio of a group. */
export function GradeTag(props: TagProps) {
  const { family, name, size = "md", className } = props;
  const look = classes("tag", hatchClass(family), size === "lg" && "lg", className);
  const face = (
    <>
      <i className="hatch" aria-hidden="true" />
      <span>{name}</span>
    </>
  );
  if (props.as === "link")
    return (
      <Link className={look} href={props.href}>
        {face}
      </Link>
    );
  if (props.as === "button") {
    const { pressed, ...rest } = without(props, "family", "name", "size", "className", "as");
    return (
      <button type="button" {...rest} className={look} aria-pressed={pressed}>
        {face}
      </button>
    );
  }
  if (props.as === "radio") {
    const { field, ...rest } = without(props, "family", "name", "size", "className", "as");
    return (
      <label className={look}>
        <input type="radio" {...rest} name={field} className="vh" />
        {face}
      </label>
    );
  }
  return <span className={look}>{face}</span>;
}
