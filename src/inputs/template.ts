export const studyTemplate = () => '';
