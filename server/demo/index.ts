/** The demo exercise: an invented country, an invented storm, and the files they ship as. */
export { readScenario } from './scenario';
export { demoExercise } from './exercise';
