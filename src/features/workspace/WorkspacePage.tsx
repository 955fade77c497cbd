import { useParams } from "react-router-dom";
import { usePlan } from "../../lib/plans";

export default function WorkspacePage() {
  const { data } = usePlan(useParams().planId);
  return <h1 className="p-5 text-xl">{data?.name}</h1>;
}
