import { Chart, LineElement, LinearScale, PointElement, ScatterController, Tooltip } from 'chart.js';

/** Chart.js with what our charts need of it; loaded when the first chart is drawn. */
Chart.register(ScatterController, LineElement, PointElement, LinearScale, Tooltip);

export { Chart };
