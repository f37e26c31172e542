// The first import of every program of this project: libraries read both variables while they load.
// Dates that Sequelize is given raw are written in the process's own zone, so that zone has to be UTC.
process.env.NODE_ENV ??= 'production'
process.env.TZ = 'UTC'

export {}
