export { ForecastsPage as default } from '../../../forecasts/ForecastsPage';
