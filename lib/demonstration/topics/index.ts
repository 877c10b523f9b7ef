import { bridgingTopics } from '@/lib/demonstration/topics/bridging';
import { coastTopics } from '@/lib/demonstration/topics/coast';
import { freshwaterTopics } from '@/lib/demonstration/topics/freshwater';
import { peatTopics } from '@/lib/demonstration/topics/peat';

export { departments, type Department, type Owner, type Topic } from '@/lib/demonstration/topics/topic';

/** All topics; their place in this list is their number. */
export const topics = [...freshwaterTopics, ...peatTopics, ...coastTopics, ...bridgingTopics];

/** Numbers of the neighbours of each topic. */
export const neighbourNumbers = topics.map(({ neighbours }) => neighbours.map((key) => topics.findIndex((topic) => topic.key === key)));
