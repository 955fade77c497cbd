import { usePageTitle } from "../../lib/title";

export default function PlansPage() {
  usePageTitle("Plans");
  return <h1 className="p-5 text-xl">Plans</h1>;
}
