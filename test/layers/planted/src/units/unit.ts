export const unit = 1;
