#!/bin/sh
# One share of a memory simulation per array task. What is simulated stands on the command line of sbatch:
#   sbatch --array=1-8 slurm-array.sh --uniform 3e-3 --distance 3,5,7 --shots 1e8
# FTESTIMATE is the published program; counts go to the folder sbatch is called in.
#SBATCH --job-name=memory
#SBATCH --array=1-4
#SBATCH --cpus-per-task=1
#SBATCH --time=01:00:00
#SBATCH --signal=TERM@60
#SBATCH --requeue
#SBATCH --open-mode=append
#SBATCH --output=memory-%A_%a.log

counts="memory-$SLURM_ARRAY_TASK_ID.json"
keep=--counts
if [ -e "$counts" ]; then
    keep=--resume
fi

# srun, so that the signal before the time limit reaches the program
srun --cpus-per-task="$SLURM_CPUS_PER_TASK" "${FTESTIMATE:-FtEstimate.Cli}" memory "$@" \
    --threads "$SLURM_CPUS_PER_TASK" --shard "$SLURM_ARRAY_TASK_ID/$SLURM_ARRAY_TASK_COUNT" "$keep" "$counts"
status=$?

# 130: interrupted with its counts written; run again from there
if [ "$status" -eq 130 ]; then
    scontrol requeue "${SLURM_ARRAY_JOB_ID}_$SLURM_ARRAY_TASK_ID"
fi

exit "$status"
