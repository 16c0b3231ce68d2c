import {
  BaseEdge,
  getSmoothStepPath,
  Handle,
  MarkerType,
  Panel,
  Position,
  ReactFlow,
  ReactFlowProvider,
  useReactFlow,
  type Connection,
  type Edge,
  type EdgeProps,
  type Node,
  type NodeProps,
} from "@xyflow/react";
import "@xyflow/react/dist/base.css";
import { useMemo, type KeyboardEvent } from "react";
import { sortWords, type ChainLink } from "#lib/circuit/voice/index.ts";
import type { Port, PortSort } from "#lib/circuit/index.ts";
import { StateMark, stateWords } from "../page/StateMark.tsx";
import type { StageRow } from "../voice/StageList.tsx";
import { boxSize, placeBoxes } from "./layout.ts";

/** An alias, since the drawing package wants data with an open index. */
export type DrawnStage = {
  row: StageRow;
  ports: readonly Port[];
  lane: "upper" | "lower";
  apart: boolean;
};

interface ChainDrawingProps {
  stages: readonly DrawnStage[];
  links: readonly ChainLink[];
  chosen: string | undefined;
  editable: boolean;
  onChoose: (id: string) => void;
  onLink: (ends: Pick<ChainLink, "from" | "to">) => void;
}

type BoxNode = Node<
  DrawnStage & { chosen: boolean; onChoose: (id: string) => void; onKey: (event: KeyboardEvent) => void }
>;
type SortEdge = Edge<{ sort: PortSort }>;

const offset = (index: number, count: number) => `${((index + 1) / (count + 1)) * 100}%`;

function Box({ data, isConnectable }: NodeProps<BoxNode>) {
  const { row, ports, chosen, apart, onChoose, onKey } = data;
  const figures = row.figures.map(({ value, unit }) => `${value}${unit && `\u00a0${unit}`}`).join(" · ") || row.network;
  const inputs = ports.filter(({ direction }) => direction === "in");
  const outputs = ports.filter(({ direction }) => direction === "out");
  return (
    <>
      {inputs.map(({ id, label, sort }, index) => (
        <Handle
          key={id}
          id={id}
          type="target"
          position={Position.Left}
          className={`chain-port ${sort}`}
          style={{ top: offset(index, inputs.length) }}
          title={`${label}: ${sortWords[sort]}`}
          isConnectable={isConnectable}
        />
      ))}
      <button
        type="button"
        id={`box-${row.id}`}
        className={`chain-box ${chosen ? "chosen" : ""} ${apart ? "apart" : ""}`}
        style={{ width: boxSize.width, height: boxSize.height }}
        aria-pressed={chosen}
        onClick={() => onChoose(row.id)}
        onKeyDown={onKey}
      >
        <span className="chain-name">{row.name}</span>
        <span className="sr-only">, </span>
        <StateMark state={row.state} word="" />
        <span className="chain-figures fig">{figures}</span>
        <span className="sr-only">, {stateWords[row.state]}</span>
      </button>
      {outputs.map(({ id, label, sort }, index) => (
        <Handle
          key={id}
          id={id}
          type="source"
          position={Position.Right}
          className={`chain-port ${sort}`}
          style={{ top: offset(index, outputs.length) }}
          title={`${label}: ${sortWords[sort]}`}
          isConnectable={isConnectable}
        />
      ))}
    </>
  );
}

function Line({ data, markerEnd, ...ends }: EdgeProps<SortEdge>) {
  const [path] = getSmoothStepPath({ ...ends, borderRadius: 0, offset: 16 });
  return <BaseEdge path={path} className={`chain-link ${data?.sort ?? "audio"}`} {...(markerEnd && { markerEnd })} />;
}

const nodeTypes = { box: Box };
const edgeTypes = { line: Line };

/** The chain, drawn: boxes in two lanes, links by the sort of signal. Every box is a button; arrow keys go from box to box. */
export default function ChainDrawing(props: ChainDrawingProps) {
  return (
    <ReactFlowProvider>
      <Drawing {...props} />
    </ReactFlowProvider>
  );
}

function Drawing({ stages, links, chosen, editable, onChoose, onLink }: ChainDrawingProps) {
  const flow = useReactFlow();
  const shape = JSON.stringify([
    stages.map(({ row, lane }) => [row.id, lane]),
    links.map(({ from, to }) => [from, to]),
  ]);
  const places = useMemo(
    () =>
      placeBoxes(
        stages.map(({ row, lane }) => ({ id: row.id, lane })),
        links.map(({ from, to }) => ({ from: from.stage, to: to.stage })),
      ),
    // Values of the stages come and go; only the shape of the chain moves boxes.
    // eslint-disable-next-line react-hooks/exhaustive-deps
    [shape],
  );
  const at = new Map(places.map((place) => [place.id, place]));
  const goTo = (id: string | undefined) => {
    if (id === undefined) return;
    document.getElementById(`box-${id}`)?.focus();
    const place = at.get(id);
    if (place) void flow.setCenter(place.x + boxSize.width / 2, place.y + boxSize.height / 2, { zoom: flow.getZoom() });
  };
  const keyIn = (id: string) => (event: KeyboardEvent) => {
    const here = at.get(id)!;
    const near = (list: typeof places) =>
      [...list].sort((a, b) => Math.hypot(a.x - here.x, a.y - here.y) - Math.hypot(b.x - here.x, b.y - here.y))[0]?.id;
    const next = {
      ArrowRight: () => near(places.filter(({ x }) => x > here.x)),
      ArrowLeft: () => near(places.filter(({ x }) => x < here.x)),
      ArrowDown: () => near(places.filter(({ y }) => y > here.y)),
      ArrowUp: () => near(places.filter(({ y }) => y < here.y)),
    }[event.key];
    if (!next) return;
    event.preventDefault();
    goTo(next());
  };
  const sortOf = (link: ChainLink): PortSort =>
    stages.find(({ row }) => row.id === link.from.stage)?.ports.find(({ id }) => id === link.from.port)?.sort ??
    "audio";
  const nodes: BoxNode[] = stages.map((stage) => ({
    id: stage.row.id,
    type: "box",
    position: at.get(stage.row.id) ?? { x: 0, y: 0 },
    initialWidth: boxSize.width,
    initialHeight: boxSize.height,
    // The package lets the pointer through what it neither drags nor selects; the box has a button of its own.
    style: { pointerEvents: "all" },
    data: { ...stage, chosen: chosen === stage.row.id, onChoose, onKey: keyIn(stage.row.id) },
  }));
  const edges: SortEdge[] = links.map((link) => ({
    id: link.id,
    type: "line",
    source: link.from.stage,
    target: link.to.stage,
    sourceHandle: link.from.port,
    targetHandle: link.to.port,
    data: { sort: sortOf(link) },
    markerEnd: { type: MarkerType.ArrowClosed, color: "currentColor", width: 14, height: 14 },
  }));
  const connect = ({ source, target, sourceHandle, targetHandle }: Connection) =>
    onLink({
      from: { stage: source, port: sourceHandle ?? "" },
      to: { stage: target, port: targetHandle ?? "" },
    });
  return (
    <ReactFlow
      nodes={nodes}
      edges={edges}
      nodeTypes={nodeTypes}
      edgeTypes={edgeTypes}
      onConnect={connect}
      nodesDraggable={false}
      nodesConnectable={editable}
      nodesFocusable={false}
      edgesFocusable={false}
      elementsSelectable={false}
      deleteKeyCode={null}
      zoomOnScroll={false}
      preventScrolling={false}
      onlyRenderVisibleElements={stages.length > 60}
      minZoom={0.15}
      maxZoom={1.5}
      fitView
      fitViewOptions={{ padding: 0.08, maxZoom: 1 }}
      proOptions={{ hideAttribution: true }}
      aria-label="The chain, drawn"
    >
      <Panel position="bottom-right" className="chain-zoom">
        <button type="button" className="btn" onClick={() => void flow.zoomIn()}>
          Closer
        </button>
        <button type="button" className="btn" onClick={() => void flow.zoomOut()}>
          Farther
        </button>
        <button type="button" className="btn" onClick={() => void flow.fitView({ padding: 0.08, maxZoom: 1 })}>
          Whole chain
        </button>
      </Panel>
      <Panel position="bottom-left" className="chain-legend">
        {(["audio", "trigger", "control", "bias"] as const).map((sort) => (
          <span key={sort}>
            <svg width="30" height="8" aria-hidden="true">
              <line className={`chain-link ${sort}`} x1="0" x2="30" y1="4" y2="4" />
            </svg>
            {sort}
          </span>
        ))}
      </Panel>
    </ReactFlow>
  );
}
