#!/bin/sh
#SBATCH --job-name=balcony
#SBATCH --array=1-10
#SBATCH --cpus-per-task=2
# One job of an array in a batch queue (here: Slurm). Submit it from the root of the repository, on
# a file system that all nodes share:
#
#   sbatch cases/cluster/array-job.sh
#
# Each job solves its share and writes study/shard-K-of-N.jsonl; a job that was killed and is
# submitted again goes on where it stopped. When all are done, this merges them and draws the chart
# without solving anything again:
#
#   cat study/shard-*.jsonl > study/sweep.jsonl
#   cli/coldseam sweep cases/demo/balcony.yaml --set insulation=100..240/200 --out study
#
# COLDSEAM_POINTS and COLDSEAM_STUDY change how many points there are and where they go.
set -eu
exec cli/coldseam sweep cases/demo/balcony.yaml \
  --set "insulation=100..240/${COLDSEAM_POINTS:-200}" \
  --shard "$SLURM_ARRAY_TASK_ID/$SLURM_ARRAY_TASK_COUNT" \
  --jobs "${SLURM_CPUS_PER_TASK:-2}" \
  --out "${COLDSEAM_STUDY:-study}"
